import { randomUUID } from 'node:crypto';
import type { Actor } from '@/lib/auth/actor';
import type { MovePreview } from '@/lib/contracts/moves';
import { moveSitting } from '@/lib/data/sittings/move-sitting';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import type { Task } from '@/lib/practicals/task';
import type { Attempt, Points, Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { cellValueSchema } from '@/lib/sync/cells';
import { deriveAttempt } from '@/lib/sync/derive';
import { value } from './answers';
import { ownerSql } from './database';
import type { RoundStage } from './round-stage';
import { defaultForm, defaultRubric } from './rubrics';

/** The default rubric with other prices for what is past the first band. */
export function pricedAt(rubric: Rubric, factor: number): Rubric {
  const times = (points: Points) => points * factor;
  const bands = (side: { within: number; lose: Points }[]) =>
    side.map(({ within, lose }) => ({ within, lose: times(lose) }));
  return {
    ...rubric,
    lines: rubric.lines.map((line) => {
      const { over, under, beyondOver, beyondUnder } = line.sizes.length;
      const rule = {
        ...line.sizes.length,
        over: bands(over),
        under: bands(under),
        beyondOver: times(beyondOver),
        beyondUnder: times(beyondUnder),
      };
      return { ...line, sizes: { thickness: rule, width: rule, length: rule } };
    }),
  };
}

export const dearer = pricedAt(defaultRubric(), 2);

/** Without one of the lines. */
export function withoutLine(rubric: Rubric, lineId: string): Rubric {
  return { ...rubric, lines: rubric.lines.filter(({ id }) => id !== lineId) };
}

/** Publishes another version of the stage's practical. */
export async function addVersion(
  { school, practical, teacher }: RoundStage,
  number: number,
  rubric: Rubric,
  more: { form?: RubricForm; task?: Task } = {},
): Promise<string> {
  const sql = ownerSql();
  const id = randomUUID();
  const json = (content: object) => sql.json(JSON.parse(JSON.stringify(content)));
  await sql`
    insert into rubric_versions
      (school_id, id, practical_id, number, task, form, rubric, engine_version, published_by)
    values (${school.id}, ${id}, ${practical.practicalId}, ${number}, ${json(more.task ?? practical.task)},
      ${json(more.form ?? defaultForm())}, ${json(rubric)}, 1, ${teacher.personId})`;
  return id;
}

export async function preview(stage: RoundStage, versionId: string): Promise<MovePreview> {
  return value(await previewMove(stage.teacher, { sittingId: stage.sittingId, versionId }));
}

/** Moves the stage's sitting as somebody does who has just looked. */
export async function move(
  stage: RoundStage,
  versionId: string,
  { holdHarmless = false, by = stage.teacher }: { holdHarmless?: boolean; by?: Actor } = {},
) {
  const { seen } = await preview(stage, versionId);
  return moveSitting(by, { sittingId: stage.sittingId, versionId, holdHarmless, seen });
}

export async function publish({ teacher, sittingId }: RoundStage) {
  const { seen } = value(await previewPublication(teacher, { sittingId }));
  return value(await publishSitting(teacher, { sittingId, seen, withoutUnread: true, lateLocks: 'count' }));
}

/** The record of an attempt as it follows from the stored events alone. */
export async function recordFromEvents(attemptId: string, side: 'bench' | 'own' = 'bench'): Promise<Attempt> {
  const rows = await ownerSql()`select * from reading_events where attempt_id = ${attemptId}`;
  const events = rows.map((row) => ({
    id: String(row.id),
    side: row.side === 'own' ? ('own' as const) : ('bench' as const),
    cell: { lineId: String(row.line_id), ordinal: Number(row.ordinal), what: String(row.what) },
    value: cellValueSchema.parse(row.value),
    supersedes: row.supersedes as string[],
    capturedAt: '2026-12-01T15:00:00.000Z',
    authorId: String(row.author_id),
  }));
  return deriveAttempt(events, side).attempt;
}

/** Where the sitting stands and what is stored of its attempts; the same before and after a refusal. */
export async function standOf({ sittingId }: RoundStage) {
  const sql = ownerSql();
  const [sitting] = await sql<{ number: number; moves: number; undone: number; log: number }[]>`
    select v.number,
      (select count(*)::int from sitting_moves m where m.sitting_id = s.id) as moves,
      (select count(*)::int from sitting_moves m where m.sitting_id = s.id and undone_at is not null) as undone,
      (select count(*)::int from access_log l where l.subject_id = s.id and action = 'sitting.move') as log
    from sittings s join rubric_versions v on v.id = s.rubric_version_id where s.id = ${sittingId}`;
  const sheets = await sql<{ attempt_id: string; score: number | null; held: number; total: number }[]>`
    select c.attempt_id, c.side, v.number as version, c.score_points as score, c.provisional_points as provisional,
      c.total_points as total, c.held_points as held, c.lost_points as lost, c.complete, c.accommodation_id, c.sheet
    from score_sheets c join attempts a on a.id = c.attempt_id join rubric_versions v on v.id = c.rubric_version_id
    where a.sitting_id = ${sittingId} order by c.attempt_id, c.side`;
  return { ...sitting, sheets: [...sheets] };
}

export async function latestMove({ sittingId }: RoundStage): Promise<string> {
  const [row] = await ownerSql()<{ id: string }[]>`
    select id from sitting_moves where sitting_id = ${sittingId} order by number desc limit 1`;
  return row?.id ?? '';
}
