import { Fraction } from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { readSharedVersion } from '@/lib/data/department/read-shared-version';
import { type Attempt, attemptSchema, type Rubric, rubricSchema } from '@/lib/scoring';
import { ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  makeStarter,
  publishAndOffer,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import type { Misses } from '@/tests/support/readings';
import { scoreByOracle } from '@/tests/support/scoring-oracle';
import { makeSharedSchool, offerAndAdopt, recordSection } from '@/tests/support/shared-school';

const { school, rut, dayo, head } = await makeSharedSchool();

/** As many students as asked for, each with other sizes off by another step. */
function classOf(count: number): Misses[] {
  const lengths = ['4', '3 15/16', '3 29/32', '4 1/16', '3 31/32', '3 7/8'];
  const widths = ['3 1/2', '3 17/32', '3 9/16', '3 15/32'];
  return Array.from({ length: count }, (_, index) => ({
    'end/1/length': lengths[index % lengths.length] ?? '4',
    'end/2/length': lengths[(index * 5 + 1) % lengths.length] ?? '4',
    'base/1/width': widths[index % widths.length] ?? '3 1/2',
  }));
}

async function rubricOf(versionId: string): Promise<Rubric> {
  const [row] = await ownerSql()`select rubric from rubric_versions where id = ${versionId}`;
  return rubricSchema.parse(row?.rubric);
}

async function recordedIn(sittingId: string): Promise<Attempt[]> {
  const rows = await ownerSql()`select h.recorded from score_sheets h join attempts a on a.id = h.attempt_id
    where a.sitting_id = ${sittingId} and h.side = 'bench' and h.complete`;
  return rows.map(({ recorded }) => attemptSchema.parse(recorded));
}

const sharesOf = (rubric: Rubric, attempts: Attempt[]): Fraction[] =>
  attempts.map((attempt) => {
    const { provisional, total } = scoreByOracle(rubric, attempt);
    return new Fraction(provisional ?? 0).div(total).mul(10_000);
  });

/** To the nearest multiple, a half going up. */
const rounded = (value: Fraction, multiple: number) =>
  Number(value.div(multiple).add(new Fraction(1, 2)).floor().mul(multiple).valueOf());

const meanOf = (values: Fraction[]) =>
  rounded(values.reduce((sum, value) => sum.add(value), new Fraction(0)).div(values.length), 10);

const dearer = await offerAndAdopt(rut, dayo);
await changeDraft(dayo, dearer.copyId, (draft) => {
  draft.all.sizes.length = {
    ...draft.all.sizes.length,
    mirrored: false,
    under: {
      bands: [
        { within: '1/64', lose: '0' },
        { within: '1/16', lose: '2' },
      ],
      beyond: '6',
    },
  };
});
const okonjo = await publishAndOffer(dayo, dearer.copyId);
const third = await recordSection(school, rut, dearer.versionId, classOf(12), '3');
const fifth = await recordSection(school, dayo, okonjo.versionId, classOf(10), '5');
const few = await recordSection(school, dayo, dearer.versionId, classOf(9), '7');

describe('what a shared version would do', () => {
  it('is what pricing each recorded attempt anew, by other code, comes to', async () => {
    const { sections, scale } = valueFrom(await readSharedVersion(head, { versionId: dearer.versionId }));
    expect(scale).toEqual({ kind: 'points', total: 10_000 });
    const under = await rubricOf(dearer.versionId);
    for (const [sitting, own] of [
      [third, dearer.versionId],
      [fifth, okonjo.versionId],
    ] as const) {
      const attempts = await recordedIn(sitting.sittingId);
      const now = sharesOf(await rubricOf(own), attempts);
      const then = sharesOf(under, attempts);
      const found = sections.find(({ sittingId }) => sittingId === sitting.sittingId);
      const [meanNow, meanThen] = [meanOf(now), meanOf(then)];
      expect(found).toMatchObject({
        students: attempts.length,
        effect: { meanNow, meanThen, change: meanThen - meanNow },
      });
      const changes = then.map((each, index) => Number(each.sub(now[index] ?? 0).valueOf()));
      expect(found?.effect?.changes).toEqual(changes.sort((a, b) => a - b));
    }
    const [same, other] = [third, fifth].map(
      ({ sittingId }) => sections.find((each) => each.sittingId === sittingId)?.effect,
    );
    expect(same?.change).toBe(0);
    expect(other?.change).toBeGreaterThan(0);
    expect(sections.map(({ period }) => period)).toEqual(['3', '5', '7']);
  });

  it('tells of fewer than ten students their number alone, and of nobody the name', async () => {
    const view = valueFrom(await readSharedVersion(head, { versionId: dearer.versionId }));
    expect(view.sections.find(({ sittingId }) => sittingId === few.sittingId)).toMatchObject({
      students: 9,
      effect: null,
    });
    const said = JSON.stringify(view);
    const people = await ownerSql()<{ id: string; given_name: string; family_name: string }[]>`
      select p.id, p.given_name, p.family_name from people p join attempts a on a.student_id = p.id`;
    expect(people).toHaveLength(31);
    for (const { id } of people) expect(said).not.toContain(id);
    for (const id of [...third.attemptIds, ...fifth.attemptIds]) expect(said).not.toContain(id);
  });

  it('counts a student once, the latest attempt that is read to the end and not in dispute', async () => {
    const place = await makeSharedSchool();
    const { versionId } = await publishAndOffer(place.rut, await makeStarter(place.rut, 'desk-caddy'));
    const { sittingId, attemptIds } = await recordSection(place.school, place.rut, versionId, classOf(11));
    const count = async () =>
      valueFrom(await readSharedVersion(place.head, { versionId })).sections.map(({ students }) => students);
    expect(await count()).toEqual([11]);
    await ownerSql()`
      insert into attempts (school_id, sitting_id, student_id, number)
      select school_id, sitting_id, student_id, 2 from attempts where sitting_id = ${sittingId} limit 3`;
    expect(await count()).toEqual([11]);
    await ownerSql()`update score_sheets set conflicts = 1 where attempt_id = ${attemptIds[0] ?? ''}`;
    expect(await count()).toEqual([10]);
    await ownerSql()`update attempts set standing = 'absent' where id = ${attemptIds[1] ?? ''}`;
    expect(valueFrom(await readSharedVersion(place.head, { versionId })).sections).toMatchObject([
      { students: 9, effect: null },
    ]);
  });

  it('compares shares of the total where the totals differ', async () => {
    const place = await makeSharedSchool();
    const practicalId = await makeStarter(place.rut, 'desk-caddy');
    const { versionId } = await publishAndOffer(place.rut, practicalId);
    const { sittingId } = await recordSection(place.school, place.rut, versionId, classOf(10));
    await changeDraft(place.rut, practicalId, (draft) => {
      draft.total.outOf = '';
      draft.all.worth = '8';
    });
    const second = await publishDraft(place.rut, practicalId);
    const view = valueFrom(await readSharedVersion(place.head, { versionId: second.versionId }));
    expect(view.scale).toEqual({ kind: 'share' });
    const attempts = await recordedIn(sittingId);
    const then = sharesOf(await rubricOf(second.versionId), attempts).map(
      (share) => new Fraction(rounded(share, 1)),
    );
    expect(view.sections[0]?.effect?.meanThen).toBe(meanOf(then));
  });

  it('looks at sections of the department that have readings of the same cut list, and logs that it did', async () => {
    const hook = await publishAndOffer(rut, await makeStarter(rut, 'bench-hook'));
    expect(valueFrom(await readSharedVersion(head, { versionId: hook.versionId })).sections).toEqual([]);
    const rows = await ownerSql()`
      select details from access_log where subject_id = ${dearer.versionId} and action = 'rubric.compare'`;
    expect(rows).toEqual([{ details: { sections: 3 } }]);
  });
});
