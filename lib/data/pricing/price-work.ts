import {
  type Attempt,
  type Dropped,
  judgePrediction,
  type Points,
  type PredictionJudgement,
  projectAttempt,
  type Rubric,
  type ScoreSheet,
  scoreAttempt,
} from '@/lib/scoring';
import { markAttempt } from '@/lib/scoring/mark-attempt';
import { modifyAttempt } from '@/lib/scoring/modification';
import { layOutWorksheet, type Worksheet } from '@/lib/scoring/worksheet';
import { holdScore } from './hold-score';
import type { PricedVersion, Pricing } from './pricing';

/** The bench's record, and the student's own where its prediction counts. */
export interface RecordedWork {
  bench: Attempt;
  own: Attempt | null;
}

/** What a work comes to under one version. */
export interface PricedWork {
  score: Points | null;
  provisional: Points | null;
  total: Points;
  judgement: PredictionJudgement | null;
}

/** What an earlier version gave beyond the present one; 0 and null where it gave nothing. */
export interface HeldPoints {
  points: Points;
  version: PricedVersion | null;
}

const worksheets = new WeakMap<Rubric, Worksheet>();

function worksheetOf(rubric: Rubric): Worksheet {
  const known = worksheets.get(rubric) ?? layOutWorksheet(rubric);
  worksheets.set(rubric, known);
  return known;
}

/** Whether the version asks for all that is recorded, so that nothing has to be left out of it. */
function asksForAll({ lineOf, workChecks }: Worksheet, { pieces, work, adjust }: Attempt): boolean {
  if (adjust !== undefined) return false;
  for (const { lineId, ordinal, checks } of pieces) {
    const line = lineOf.get(lineId);
    if (line === undefined || ordinal > line.line.quantity) return false;
    for (const id in checks) if (!isLevel(line.checks, id, checks[id])) return false;
  }
  for (const id in work) if (!isLevel(workChecks, id, work[id])) return false;
  return true;
}

function isLevel({ byId }: Worksheet['workChecks'], id: string, level: number | undefined): boolean {
  return level !== undefined && byId.get(id)?.loses[level] !== undefined;
}

/**
 * The record as a version counts it: without what that version does not ask for, and with what is excused excused.
 * What is left out stays recorded, for the versions that ask for it.
 */
export function fitAttempt({ published, modification }: PricedVersion, attempt: Attempt): Attempt {
  const known = asksForAll(worksheetOf(published), attempt)
    ? attempt
    : projectAttempt(published, attempt).attempt;
  return modification ? modifyAttempt(published, known, modification) : known;
}

/** What is recorded and a version does not ask for. */
export function leftOut({ published }: PricedVersion, attempt: Attempt): Dropped[] {
  return asksForAll(worksheetOf(published), attempt) ? [] : projectAttempt(published, attempt).dropped;
}

/** The full sheet of a record under a version. */
export function sheetUnder(version: PricedVersion, attempt: Attempt): ScoreSheet {
  return scoreAttempt(version.rubric, fitAttempt(version, attempt));
}

/** Prices a work under one version; only work that is read to the end earns the bonus of its prediction. */
export function priceUnder(version: PricedVersion, { bench, own }: RecordedWork): PricedWork {
  const { rubric, policy } = version;
  const fitted = fitAttempt(version, bench);
  const worksheet = worksheetOf(rubric);
  const bare = markAttempt(worksheet, { ...fitted, bonus: 0 });
  const { total, complete } = bare;
  const judgement =
    own && complete && bare.provisional !== null
      ? judgePrediction(rubric, fitAttempt(version, own), fitted, policy)
      : null;
  const bonus = judgement?.bonus ?? 0;
  const { provisional } = bonus > 0 ? markAttempt(worksheet, { ...fitted, bonus }) : bare;
  return { score: complete ? provisional : null, provisional, total, judgement };
}

/** Prices one work under version after version, under each once. */
export function pricerOf(work: RecordedWork): (version: PricedVersion) => PricedWork {
  const known = new Map<Rubric, PricedWork>();
  return (version) => {
    const priced = known.get(version.rubric) ?? priceUnder(version, work);
    known.set(version.rubric, priced);
    return priced;
  };
}

/**
 * What the versions that a pricing holds add to what the work comes to now. A work with a score is held against the
 * versions under which it has one, bonus included; one that is still being read, against what it would come to so far.
 */
export function holdPoints(
  pricing: Pricing,
  now: PricedWork,
  priceBy: (version: PricedVersion) => PricedWork,
): HeldPoints {
  const kind = now.score === null ? 'provisional' : 'score';
  const score = now[kind];
  if (score === null || pricing.held.length === 0) return { points: 0, version: null };
  const earlier = pricing.held.flatMap((version) => {
    const priced = priceBy(version);
    return priced[kind] === null ? [] : [{ version, score: priced[kind], total: priced.total }];
  });
  const { points, from } = holdScore({ score, total: now.total }, earlier, pricing.rubric);
  return { points, version: from === null ? null : (earlier[from]?.version ?? null) };
}
