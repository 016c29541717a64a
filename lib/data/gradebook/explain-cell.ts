import 'server-only';
import { selectSection } from '@/db/queries/sections';
import { cellInput, type ExplanationView } from '@/lib/contracts/gradebook';
import { judgementSchema, scoreSheetSchema } from '@/lib/contracts/results';
import { type Attempt, scoreAttempt } from '@/lib/scoring';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { countedScore, redoInWords } from './counted-score';
import { explainRows } from './explain-rows';
import { type CellAttempt, recordingOf } from './gradebook-cells';
import { type LoadedSitting, loadSittings } from './load-gradebook';

const NOTHING: Attempt = { pieces: [], work: {}, bonus: 0, daysLate: 0 };

/** Where the points of one attempt went, as it was published, or as it stands while it is recorded. */
export const explainCell = defineVerb({
  action: 'gradebook.read',
  input: cellInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<ExplanationView> {
    const { schoolId } = actor;
    const { sectionId, attemptId } = input;
    const section = found(await selectSection(tx, schoolId, sectionId));
    authorize(sectionSubject(section));
    const sittings = await loadSittings(tx, schoolId, sectionId);
    const sitting = found(
      sittings.find(({ attempts }) => attempts.some((row) => row.attemptId === attemptId)),
    );
    const row = found(sitting.attempts.find((each) => each.attemptId === attemptId));
    await logView({ subjectKind: 'attempt', subjectId: attemptId, aboutPersonId: row.studentId });
    return explain(sitting, { row, result: sitting.latest?.results.get(attemptId) });
  },
});

function explain(sitting: LoadedSitting, { row, result }: CellAttempt): ExplanationView {
  const version = result && sitting.latest ? sitting.latest.version : sitting.version;
  const { task, form, rubric } = version;
  const { redo } = form.policies;
  const stored = scoreSheetSchema.nullable().parse(result ? result.sheet : row.sheet);
  const sheet = stored ?? scoreAttempt(rubric, NOTHING);
  const attempts = sitting.attempts
    .filter(({ studentId }) => studentId === row.studentId)
    .map((each) => ({ row: each, result: sitting.latest?.results.get(each.attemptId) }));
  const scores = attempts.map(scoreOf);
  const bonus = result?.bonusPoints ?? 0;
  const told = result ? { status: result.status, score: result.scorePoints } : recordingOf(row);
  return {
    attemptId: row.attemptId,
    attemptNumber: row.number,
    sittingId: sitting.sittingId,
    studentId: row.studentId,
    familyName: row.familyName,
    givenName: row.givenName,
    title: sitting.title,
    versionNumber: version.number,
    unit: rubric.unit,
    published: result !== undefined,
    status: told.status,
    score: told.score,
    attempts: attempts.map(({ row: each }, index) => ({
      attemptId: each.attemptId,
      number: each.number,
      score: scores[index]?.score ?? null,
    })),
    counted: countedScore(redo, scores)?.score ?? null,
    redo: attempts.length > 1 ? redoInWords(redo) : null,
    ...explainRows(task, rubric, sheet, bonus),
    bonus,
    roundTo: rubric.roundTo,
    daysLate: row.daysLate,
    predicted: result?.predictedPoints ?? null,
    judgement: judgementSchema.nullable().parse(result?.judgement ?? null),
  };
}

function scoreOf({ row, result }: CellAttempt) {
  return result
    ? { score: result.scorePoints, total: result.totalPoints }
    : { score: row.scorePoints, total: row.totalPoints ?? 0 };
}
