import 'server-only';
import { selectSection } from '@/db/queries/sections';
import { previewRosterInput } from '@/lib/contracts/sections';
import type { CsvRow } from '@/lib/csv/parse-csv';
import type { RosterLayout } from '@/lib/csv/roster-columns';
import { appendLog, defineVerb } from '../verb';
import { judgeRosterText, type RosterRowView } from './roster-preview';
import { sectionSubject } from './section-view';

export interface RosterPreviewView {
  layout: RosterLayout;
  /** The first rows as they stand, to show beside the columns. */
  first: CsvRow[];
  rows: RosterRowView[];
  seen: string;
}

/**
 * What an import of this text would do, row by row. Changes nothing; whom of the school it shows who is not in the
 * section is in the access log.
 */
export const previewRoster = defineVerb({
  action: 'roster.change',
  input: previewRosterInput,
  async run({ actor, input, tx, authorize, found, refuseFields }): Promise<RosterPreviewView> {
    const section = found(await selectSection(tx, actor.schoolId, input.sectionId));
    authorize(sectionSubject(section));
    const judged = await judgeRosterText(tx, actor, section, input.roster);
    if ('reason' in judged) return refuseFields({ 'roster.text': [judged.reason] });
    const { read, rows, seen } = judged;
    const shown = judged.judged.flatMap(({ verdict }) =>
      'person' in verdict && verdict.person.enrolled === null ? [verdict.person.personId] : [],
    );
    if (shown.length > 0) {
      await appendLog(tx, actor, 'roster.read', { subjectKind: 'people', details: { shown } });
    }
    return { layout: read.layout, first: read.first, rows, seen };
  },
});
