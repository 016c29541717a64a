import 'server-only';
import { lockRosters } from '@/db/queries/rosters';
import { selectSection } from '@/db/queries/sections';
import { importRosterInput } from '@/lib/contracts/sections';
import { defineVerb } from '../verb';
import { changesAnything, type ImportPlan, planImport } from './plan-import';
import { judgeRosterText } from './roster-preview';
import { sectionSubject } from './section-view';
import { writeRoster } from './write-roster';

export interface ImportedView {
  /** False when the roster already said all of it. */
  changed: boolean;
  added: number;
  enrolled: number;
  renamed: number;
  renumbered: number;
  unchanged: number;
  leftOut: number;
}

/**
 * Brings a text's students into the section, all of them or none, as the preview showed it. What has changed since
 * the preview sends the person back to look again; a text that is on the roster already changes nothing.
 */
export const importRoster = defineVerb({
  action: 'roster.change',
  input: importRosterInput,
  async run({ actor, input, tx, authorize, found, refuse, refuseFields, log }): Promise<ImportedView> {
    const { sectionId, roster, choices, leaveOutProblems, seen } = input;
    await lockRosters(tx, actor.schoolId);
    const section = found(await selectSection(tx, actor.schoolId, sectionId));
    authorize(sectionSubject(section));
    const judged = await judgeRosterText(tx, actor, section, roster);
    if ('reason' in judged) return refuseFields({ 'roster.text': [judged.reason] });
    if (!judged.read.layout.sure) {
      refuseFields({ 'roster.layout': ['Say first which column holds what.'] });
    }
    if (judged.seen !== seen) {
      refuse('stale', 'The roster or the school has changed since you looked. Look at the rows again.');
    }
    const planned = planImport(judged.judged, choices, leaveOutProblems);
    if (!planned.ok) return refuseFields(planned.fields);
    const counts = countPlan(planned.plan);
    if (!counts.changed) return counts;
    const made = await writeRoster(tx, section, planned.plan);
    await log({
      subjectKind: 'section',
      subjectId: sectionId,
      details: { ...counts, people: [...made.map(({ personId }) => personId), ...touched(planned.plan)] },
    });
    return counts;
  },
});

function countPlan(plan: ImportPlan): ImportedView {
  return {
    changed: changesAnything(plan),
    added: plan.added.length,
    enrolled: plan.enrolled.length,
    renamed: plan.renamed.length,
    renumbered: plan.renumbered.length,
    unchanged: plan.unchanged,
    leftOut: plan.leftOut,
  };
}

function touched({ enrolled, renamed, renumbered }: ImportPlan): string[] {
  const people = [
    ...enrolled,
    ...renamed.map(({ person }) => person),
    ...renumbered.map(({ person }) => person),
  ];
  return [...new Set(people.map(({ personId }) => personId))];
}
