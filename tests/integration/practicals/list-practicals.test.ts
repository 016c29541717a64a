import { describe, expect, it } from 'vitest';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { makeStarter, publishAndOffer, publishDraft, valueFrom } from '@/tests/support/practicals';
import { makeActor, makeSchool } from '@/tests/support/school';

describe('the list of practicals', () => {
  it('shows one’s own with what is published of them, and what colleagues of the department offer', async () => {
    const place = await makeSchool('Cedar Fork High School');
    const [rut, dayo] = [
      await makeActor(place, 'teacher', { givenName: 'Rut', familyName: 'Lindqvist' }),
      await makeActor(place, 'teacher', { givenName: 'Dayo', familyName: 'Okonjo' }),
    ];
    const unpublished = await makeStarter(rut, 'wall-rack');
    const published = await makeStarter(rut, 'desk-caddy');
    const version = await publishAndOffer(rut, published);
    await publishDraft(rut, await makeStarter(rut, 'gauge-kit'));
    await makeStarter(dayo, 'bench-hook');
    expect(valueFrom(await listPracticals(rut, {}))).toMatchObject({
      own: expect.arrayContaining([
        expect.objectContaining({
          practicalId: unpublished,
          version: null,
          lines: 3,
          pieces: 9,
          sittings: 0,
        }),
        expect.objectContaining({
          practicalId: published,
          version: expect.objectContaining({ number: 1 }),
          pieces: 7,
        }),
      ]),
      department: [],
    });
    expect(valueFrom(await listPracticals(dayo, {}))).toMatchObject({
      own: [{ title: 'Bench-hook kit' }],
      department: [
        {
          practicalId: published,
          versionId: version.versionId,
          ownerName: 'Rut Lindqvist',
          number: 1,
          pieces: 7,
        },
      ],
    });
  });
});
