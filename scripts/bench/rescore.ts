import { isDeepStrictEqual } from 'node:util';
import { type Attempt, type Rescored, type Rubric, rescore } from '@/lib/scoring';
import { scoreByOracle } from '@/tests/support/scoring-oracle';
import { layOutBare, loseBare } from './rescore/bare-loop';
import { makeAttempts, makeRubric } from './rescore/practical';

const ROUNDS = 5;
const WARM_UP = 10;
const LEAST_OVER_ORACLE = 25;
const AIM_OVER_ORACLE = 50;
const AIM_OF_BARE = 4;

function rescoreByOracle(rubric: Rubric, attempts: readonly Attempt[]): Rescored[] {
  return attempts.map((attempt) => {
    const { raw, lost, provisional, score, complete } = scoreByOracle(rubric, attempt);
    return { raw, lost, provisional, score, complete };
  });
}

/** The median of the rounds in milliseconds, after rounds that let the compiler settle and are not counted. */
function time<Result>(run: () => Result): { result: Result; milliseconds: number } {
  let result = run();
  for (let round = 1; round < WARM_UP; round += 1) result = run();
  const times = Array.from({ length: ROUNDS }, () => {
    const begin = performance.now();
    run();
    return performance.now() - begin;
  }).toSorted((a, b) => a - b);
  return { result, milliseconds: times[Math.floor(ROUNDS / 2)] ?? Number.NaN };
}

function show(label: string, milliseconds: number): void {
  console.log(`${label.padEnd(34)} ${milliseconds.toFixed(2).padStart(9)} ms`);
}

const rubric = makeRubric();
const attempts = makeAttempts(rubric);
const flat = layOutBare(rubric, attempts);

const product = time(() => rescore(rubric, attempts));
const bare = time(() => loseBare(flat));
const oracle = time(() => rescoreByOracle(rubric, attempts));

const sameAsOracle = isDeepStrictEqual(product.result, oracle.result);
const sameAsBare = product.result.every(({ lost }, at) => lost === bare.result[at]);
const overOracle = oracle.milliseconds / product.milliseconds;
const ofBare = product.milliseconds / bare.milliseconds;

console.log(`${attempts.length} attempts, 8 lines of 2, 3 bands, swap, 2 checks; median of ${ROUNDS}`);
show('rescore', product.milliseconds);
show('oracle in fractions', oracle.milliseconds);
show('bare loop over typed arrays', bare.milliseconds);
console.log(
  `faster than the oracle: ${overOracle.toFixed(1)} times (at least ${LEAST_OVER_ORACLE}, aim ${AIM_OVER_ORACLE})`,
);
console.log(`time of the bare loop: ${ofBare.toFixed(2)} times (aim at most ${AIM_OF_BARE})`);
console.log(
  `same results as the oracle: ${sameAsOracle ? 'yes' : 'NO'}; same losses as the bare loop: ${sameAsBare ? 'yes' : 'NO'}`,
);
if (!sameAsOracle || !sameAsBare || overOracle < LEAST_OVER_ORACLE) process.exitCode = 1;
