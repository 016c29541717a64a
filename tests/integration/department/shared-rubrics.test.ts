import { describe, expect, it } from 'vitest';
import { approveVersion } from '@/lib/data/department/approve-version';
import { endApproval } from '@/lib/data/department/end-approval';
import { listShared } from '@/lib/data/department/list-shared';
import { readSharedVersion } from '@/lib/data/department/read-shared-version';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { readOpenChoices } from '@/lib/data/sittings/read-open-choices';
import { code, fieldsOf } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, makeSection, whileLogFails } from '@/tests/support/school';
import { makeSharedSchool, offerAndAdopt } from '@/tests/support/shared-school';
import { untilWaiting } from '@/tests/support/waiting';

const { school, rut, dayo, head } = await makeSharedSchool();
const apart = { ...head, departmentId: crypto.randomUUID() };
const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');

async function approvals(versionId: string) {
  return ownerSql()<{ id: string; approved_by: string; ended_by: string | null }[]>`
    select id, approved_by, ended_by from rubric_approvals where rubric_version_id = ${versionId} order by approved_at`;
}

describe('what the department shares', () => {
  it('lists each practical on offer with its versions, where they are used and how often it was taken', async () => {
    const place = await makeSharedSchool();
    const { practicalId, versionId } = await offerAndAdopt(place.rut, place.dayo);
    await publishDraft(place.rut, await makeStarter(place.rut, 'gauge-kit'));
    const sectionId = await makeSection(place.school, { teacherIds: [place.dayo.personId] });
    valueFrom(await openSitting(place.dayo, { sectionId, versionId }));
    expect(valueFrom(await listShared(place.head, {}))).toMatchObject({
      practicals: [
        {
          ...{ practicalId, title: 'Desk caddy', ownerName: 'Rut Lindqvist', offered: true, copies: 1 },
          versions: [{ versionId, number: 1, periods: ['3'], approval: null }],
        },
      ],
    });
    expect(valueFrom(await listShared(apart, {}))).toEqual({ practicals: [] });
    for (const role of ['teacher', 'admin', 'aide', 'student'] as const) {
      expect(code(await listShared(await makeActor(place.school, role), {}))).toBe('forbidden');
    }
  });
});

describe('approving a version', () => {
  it('makes it the department’s: told in the list, at the editor and where a sitting is opened', async () => {
    const { practicalId, versionId, copyId } = await offerAndAdopt(rut, dayo, 'wall-rack');
    valueFrom(await approveVersion(head, { versionId }));
    expect(await approvals(versionId)).toMatchObject([{ approved_by: head.personId, ended_by: null }]);
    const offered = valueFrom(await listPracticals(dayo, {})).department;
    expect(offered.find((each) => each.practicalId === practicalId)).toMatchObject({
      approved: { versionId, number: 1 },
      taken: true,
    });
    for (const [actor, id] of [
      [rut, practicalId],
      [dayo, copyId],
    ] as const) {
      expect(valueFrom(await readPractical(actor, { practicalId: id })).department).toMatchObject({
        ...{ versionId, practicalId, number: 1, ownerName: 'Rut Lindqvist', approvedBy: 'Imre Vass' },
      });
    }
    const sectionId = await makeSection(school, { teacherIds: [dayo.personId] });
    const { sections } = valueFrom(await readOpenChoices(dayo, {}));
    const choices = sections.find((each) => each.sectionId === sectionId)?.versions ?? [];
    expect(choices.filter(({ approved }) => approved)).toMatchObject([{ versionId }]);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'rubric.approve',
        details: { approved: 'Wall rack', version: 1, ended: 0 },
      }),
    );
    valueFrom(await approveVersion(head, { versionId }));
    expect(await approvals(versionId)).toHaveLength(1);
  });

  it('changes no sitting, and leaves the approved version usable while it is withdrawn, until the approval ends', async () => {
    const practicalId = await makeStarter(rut, 'stair-tower');
    const { versionId } = await publishAndOffer(rut, practicalId);
    const given = await makeSection(school, { teacherIds: [rut.personId] });
    valueFrom(await openSitting(rut, { sectionId: given, versionId }));
    const sittings = () => ownerSql()`select * from sittings where section_id = ${given}`;
    const before = await sittings();
    await changeDraft(rut, practicalId, (draft) => {
      draft.all.missing = '4';
    });
    const second = await publishDraft(rut, practicalId);
    const { approvalId } = valueFrom(await approveVersion(head, { versionId: second.versionId }));
    expect(await sittings()).toEqual(before);
    valueFrom(await offerPractical(rut, { practicalId, offered: false }));
    const give = async (id: string) => {
      const sectionId = await makeSection(school, { teacherIds: [dayo.personId] });
      return openSitting(dayo, { sectionId, versionId: id });
    };
    expect(fieldsOf(await give(versionId))).toEqual(['versionId']);
    expect(await give(second.versionId)).toMatchObject({ ok: true });
    valueFrom(await endApproval(head, { approvalId }));
    expect(fieldsOf(await give(second.versionId))).toEqual(['versionId']);
  });

  it('ends the approval of the practical’s earlier version and of another rubric of the cut list', async () => {
    const first = await offerAndAdopt(rut, dayo, 'gauge-kit');
    await changeDraft(dayo, first.copyId, (draft) => {
      draft.all.worth = '12';
    });
    const { versionId: other } = await publishAndOffer(dayo, first.copyId);
    valueFrom(await approveVersion(head, { versionId: first.versionId }));
    expect(valueFrom(await readSharedVersion(head, { versionId: other })).standing).toMatchObject([
      { ownerName: 'Rut Lindqvist', number: 1 },
    ]);
    valueFrom(await approveVersion(head, { versionId: other }));
    expect(await approvals(first.versionId)).toMatchObject([{ ended_by: head.personId }]);
    await changeDraft(dayo, first.copyId, (draft) => {
      draft.all.worth = '15';
    });
    const next = await publishDraft(dayo, first.copyId);
    valueFrom(await approveVersion(head, { versionId: next.versionId }));
    expect(await approvals(other)).toMatchObject([{ ended_by: head.personId }]);
    expect(await approvals(next.versionId)).toMatchObject([{ ended_by: null }]);
  });

  it('leaves one of two rubrics of a cut list that two heads approve at the same moment', async () => {
    const place = await makeSharedSchool();
    const first = await offerAndAdopt(place.rut, place.dayo, 'gauge-kit');
    const { versionId: other } = await publishAndOffer(place.dayo, first.copyId);
    const { pressed } = await ownerSql().begin(async (tx) => {
      await tx`lock table rubric_approvals in exclusive mode`;
      const both = [first.versionId, other].map((versionId) => approveVersion(place.head, { versionId }));
      await untilWaiting(2);
      return { pressed: both };
    });
    for (const each of await Promise.all(pressed)) valueFrom(each);
    const all = [...(await approvals(first.versionId)), ...(await approvals(other))];
    expect(all.map(({ ended_by }) => ended_by === null).sort()).toEqual([false, true]);
  });

  it('is for the head of the department, for what is on offer', async () => {
    const practicalId = await makeStarter(rut, 'six-stick');
    const { versionId } = await publishDraft(rut, practicalId);
    expect(code(await approveVersion(head, { versionId }))).toBe('conflict');
    valueFrom(await offerPractical(rut, { practicalId, offered: true }));
    for (const other of [apart, stranger]) {
      expect(code(await approveVersion(other, { versionId }))).toBe('not_found');
      expect(code(await readSharedVersion(other, { versionId }))).toBe('not_found');
    }
    for (const role of ['teacher', 'admin', 'aide', 'student'] as const) {
      const other = await makeActor(school, role);
      expect(code(await approveVersion(other, { versionId }))).toBe('forbidden');
      expect(code(await readSharedVersion(other, { versionId }))).toBe('forbidden');
    }
    expect(code(await approveVersion(head, { versionId: 'one' }))).toBe('invalid');
    expect(code(await approveVersion(head, { versionId: crypto.randomUUID() }))).toBe('not_found');
    expect(await approvals(versionId)).toEqual([]);
  });

  it('is nothing when the log cannot be written, nor is ending it', async () => {
    const { versionId } = await publishAndOffer(rut, await makeStarter(rut, 'bench-hook'));
    await whileLogFails(() => approveVersion(head, { versionId }));
    expect(await approvals(versionId)).toEqual([]);
    const { approvalId } = valueFrom(await approveVersion(head, { versionId }));
    await whileLogFails(() => endApproval(head, { approvalId }));
    expect(await approvals(versionId)).toMatchObject([{ ended_by: null }]);
  });
});

describe('ending an approval', () => {
  it('keeps it as one that ended, and is the head’s of the department alone', async () => {
    const { versionId } = await publishAndOffer(rut, await makeStarter(rut, 'bench-hook'));
    const { approvalId } = valueFrom(await approveVersion(head, { versionId }));
    for (const other of [apart, stranger]) {
      expect(code(await endApproval(other, { approvalId }))).toBe('not_found');
    }
    expect(code(await endApproval(rut, { approvalId }))).toBe('forbidden');
    expect(code(await endApproval(head, { approvalId: 'it' }))).toBe('invalid');
    expect(code(await endApproval(head, { approvalId: crypto.randomUUID() }))).toBe('not_found');
    expect(await approvals(versionId)).toMatchObject([{ ended_by: null }]);
    valueFrom(await endApproval(head, { approvalId }));
    valueFrom(await endApproval(head, { approvalId }));
    expect(await approvals(versionId)).toMatchObject([{ id: approvalId, ended_by: head.personId }]);
    expect(valueFrom(await readSharedVersion(head, { versionId })).approval).toBeNull();
    const ended = (await logOf(school)).filter(({ details }) =>
      JSON.stringify(details).includes('approvalEnded'),
    );
    expect(ended.filter(({ details }) => JSON.stringify(details).includes('Bench-hook kit'))).toHaveLength(1);
  });
});
