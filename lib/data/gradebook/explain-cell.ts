import 'server-only';
import type { Transaction } from '@/db/client';
import type { AttemptRow } from '@/db/queries/attempts';
import type { ResultRow } from '@/db/queries/publications';
import { selectSection } from '@/db/queries/sections';
import { selectPricedVersions } from '@/db/queries/sheets';
import { cellInput, type ExplanationView } from '@/lib/contracts/gradebook';
import { judgementSchema, scoreSheetSchema } from '@/lib/contracts/results';
import { type Attempt, type Rubric, scoreAttempt } from '@/lib/scoring';
import { modifyRubric } from '@/lib/scoring/modification';
import { loadModifications } from '../pricing/load-pricing';
import { holdPoints, pricerOf } from '../pricing/price-work';
import { storedAttempt } from '../pricing/stored-attempt';
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
    const result = sitting.latest?.results.get(attemptId);
    const terms = result ? await termsOfResult(tx, sitting, result) : termsOfRecord(sitting, row);
    return explain(sitting, { row, result }, terms);
  },
});

/** By what a sheet was priced, and what was held beside it. */
interface Terms {
  rubric: Rubric;
  modified: boolean;
  held: ExplanationView['held'];
}

async function termsOfResult(tx: Transaction, sitting: LoadedSitting, result: ResultRow): Promise<Terms> {
  const { schoolId, accommodationId, heldPoints, heldVersionId } = result;
  const { rubric } = sitting.latest?.version ?? sitting.version;
  const modifications = await loadModifications(tx, schoolId, [accommodationId]);
  const modification = accommodationId === null ? undefined : modifications.get(accommodationId);
  const [version] = heldVersionId === null ? [] : await selectPricedVersions(tx, schoolId, [heldVersionId]);
  return {
    rubric: modification ? modifyRubric(rubric, modification) : rubric,
    modified: accommodationId !== null,
    held: version ? { points: heldPoints, versionNumber: version.number } : null,
  };
}

function termsOfRecord(sitting: LoadedSitting, row: AttemptRow): Terms {
  const pricing = sitting.pricingOf(row.attemptId);
  const bench = row.recorded === null ? NOTHING : storedAttempt(row.recorded);
  const priceBy = pricerOf({ bench, own: null });
  const { points, version } = holdPoints(pricing, priceBy(pricing), priceBy);
  return {
    rubric: pricing.rubric,
    modified: pricing.accommodationId !== null,
    held: version && { points, versionNumber: version.number },
  };
}

function explain(
  sitting: LoadedSitting,
  { row, result }: CellAttempt,
  { rubric, modified, held }: Terms,
): ExplanationView {
  const version = result && sitting.latest ? sitting.latest.version : sitting.version;
  const { task, form } = version;
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
    ...explainRows(task, rubric, sheet, bonus, held?.points),
    bonus,
    held,
    modified,
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
