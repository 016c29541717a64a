import 'server-only';
import { selectMoves, selectWholeVersions } from '@/db/queries/moves';
import { selectSitting } from '@/db/queries/sittings';
import { type MoveChoices, type MoveMade, moveChoicesInput } from '@/lib/contracts/moves';
import { changesSince } from '@/lib/practicals/changes-since';
import { storedVersion } from '../practicals/stored';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { latestPublication } from './moved-sitting';

/** Where a sitting stands, the other versions of its practical, and how it came to where it stands. */
export const readMoveChoices = defineVerb({
  action: 'sitting.move',
  input: moveChoicesInput,
  async run({ actor, input, tx, authorize, found }): Promise<MoveChoices> {
    const sitting = found(await selectSitting(tx, actor.schoolId, input.sittingId));
    authorize(sectionSubject(sitting));
    const { sittingId, title, sectionId, sectionName, period, timeZone, rubricVersionId } = sitting;
    const rows = await selectWholeVersions(tx, actor.schoolId, sitting.practicalId);
    const versions = rows.map((row) => ({ ...row, ...storedVersion(row) }));
    const present = found(versions.find(({ versionId }) => versionId === rubricVersionId));
    const published = await latestPublication(tx, sitting);
    const moves = await selectMoves(tx, actor.schoolId, sittingId);
    const latest = moves.find(({ undoneAt }) => undoneAt === null);
    return {
      ...{ sittingId, title, sectionId, sectionName, period, timeZone, unit: present.rubric.unit },
      published: sitting.state === 'published',
      version: choiceOf(present),
      others: versions
        .filter((version) => version !== present)
        .map((version) => ({ ...choiceOf(version), changes: changesSince(present, version) })),
      moves: moves.map((move) => asMade(move, move === latest && move.afterPublication === published)),
    };
  },
});

function choiceOf({
  versionId,
  number,
  publishedAt,
}: {
  versionId: string;
  number: number;
  publishedAt: Date;
}) {
  return { versionId, number, publishedAt: publishedAt.toISOString() };
}

type MoveRow = Awaited<ReturnType<typeof selectMoves>>[number];

function asMade(row: MoveRow, canUndo: boolean): MoveMade {
  const { moveId, number, movedBy, from, to, holdHarmless, undoneAt, undoneBy } = row;
  return {
    ...{ moveId, number, movedBy, from, to, holdHarmless, canUndo },
    movedAt: row.movedAt.toISOString(),
    undone: undoneAt && { at: undoneAt.toISOString(), by: undoneBy ?? '' },
  };
}
