import { randomBytes } from 'node:crypto';
import { sql } from 'drizzle-orm';
import { selectAttemptIds } from '@/db/queries/sheets';
import { inSchool } from '@/lib/data/database';
import { priceUnder } from '@/lib/data/pricing/price-work';
import { priceVersion } from '@/lib/data/pricing/pricing';
import { storedAttempt } from '@/lib/data/pricing/stored-attempt';
import { rebuildSheets } from '@/lib/data/rounds/rebuild-sheets';
import { moveSitting } from '@/lib/data/sittings/move-sitting';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { defaultForm } from '@/tests/support/rubrics';
import { migrateDatabase } from '../migrate';
import { openFleetingCluster } from '../setup/cluster.mjs';
import { ensurePostgres } from '../setup/packages.mjs';
import { ensureDatabase } from '../setup/station.mjs';
import { ATTEMPTS, layStage, type Stage } from './move/stage';

const ROUNDS = 5;
const AT_MOST_MS = 3000;

async function timed<Result>(run: () => Promise<Result> | Result): Promise<{ result: Result; ms: number }> {
  const begin = performance.now();
  const result = await run();
  return { result, ms: performance.now() - begin };
}

async function repeat<Result>(run: () => Promise<Result>): Promise<Result[]> {
  const results: Result[] = [];
  while (results.length < ROUNDS) results.push(await run());
  return results;
}

function median(times: readonly number[]): number {
  return times.toSorted((a, b) => a - b)[Math.floor(times.length / 2)] ?? Number.NaN;
}

function show(label: string, ms: number, more = ''): void {
  console.log(`${label.padEnd(44)} ${ms.toFixed(0).padStart(6)} ms${more}`);
}

async function preview({ actor, sittingId, versionId }: Stage) {
  const heard: number[] = [];
  const previewed = await previewMove(
    actor,
    { sittingId, versionId },
    { onProgress: (done) => heard.push(done) },
  );
  if (!previewed.ok) throw new Error(previewed.problem.message);
  if (previewed.value.students.length !== ATTEMPTS) throw new Error('not every attempt is in the preview');
  return { preview: previewed.value, steps: heard.length };
}

/** The same readings fetched as bare text, then parsed, then priced, each by itself. */
async function measureParts({ actor, to, versionId }: Stage) {
  const fetched = await timed(() =>
    inSchool(actor.schoolId, (tx) =>
      tx.execute<{ recorded: string }>(sql`select recorded::text as recorded from score_sheets`),
    ),
  );
  const parsed = await timed(() => fetched.result.map(({ recorded }) => storedAttempt(JSON.parse(recorded))));
  const policy = defaultForm().policies.prediction;
  const version = priceVersion({ versionId, number: 2, rubric: to, policy }, null);
  const priced = await timed(() => parsed.result.map((bench) => priceUnder(version, { bench, own: null })));
  return { database: fetched.ms, parsing: parsed.ms, scoring: priced.ms };
}

async function measure(stage: Stage): Promise<void> {
  const { schoolId } = stage.actor;
  const ids = await inSchool(schoolId, (tx) => selectAttemptIds(tx, schoolId, stage.sittingId));
  const built = await timed(() =>
    inSchool(schoolId, (tx) =>
      rebuildSheets(
        tx,
        schoolId,
        ids.map(({ attemptId }) => attemptId),
      ),
    ),
  );
  await preview(stage);
  const rounds = await repeat(() => timed(() => preview(stage)));
  const whole = median(rounds.map(({ ms }) => ms));
  const parts = await repeat(() => measureParts(stage));
  const part = (name: 'database' | 'parsing' | 'scoring') => median(parts.map((each) => each[name]));
  const sum = part('database') + part('parsing') + part('scoring');
  const share = (ms: number) => `  ${((100 * ms) / sum).toFixed(0).padStart(3)} %`;
  const last = rounds.at(-1)?.result;
  if (!last) throw new Error('nothing was measured');
  const { gain, same, lose, seen } = last.preview;

  console.log(`${ATTEMPTS} attempts of 27 sizes in one sitting; median of ${ROUNDS}`);
  show('preview of a move, from database to preview', whole, ` (at most ${AT_MOST_MS})`);
  show('  of the readings alone: fetched as text', part('database'), share(part('database')));
  show('  parsed and checked', part('parsing'), share(part('parsing')));
  show('  priced by the other version', part('scoring'), share(part('scoring')));
  console.log(`progress was told ${last.steps} times; gain ${gain}, same ${same}, lose ${lose}`);
  const moved = await timed(() => moveSitting(stage.actor, { ...stage, holdHarmless: true, seen }));
  if (!moved.result.ok) throw new Error(moved.result.problem.message);
  show('sheets built from 280 000 events', built.ms);
  show('the move itself: preview, sheets and log', moved.ms);
  if (whole > AT_MOST_MS) process.exitCode = 1;
}

await ensurePostgres();
const cluster = await openFleetingCluster('bench');
try {
  const url = await ensureDatabase(cluster);
  process.env.DATABASE_URL = url;
  process.env.APP_URL = 'http://127.0.0.1:3000';
  process.env.APP_SECRET = randomBytes(32).toString('hex');
  await migrateDatabase(url);
  await measure(await layStage(url));
} finally {
  await cluster.remove();
}
process.exit();
