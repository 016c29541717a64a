import type { CellValue } from '@/lib/sync/cells';
import { listUnread } from './cursor';
import { findPiece, listPieces } from './pieces';
import { advance } from './read-size';
import { pieceStateAt, recordOf, valueAt } from './record';
import { makeEvent, recorded, refused } from './record-events';
import type { Mint, Outcome, RoundState, Spot } from './types';

const GAUGED: CellValue = { kind: 'gauged' };
const BY_GAUGE = { typed: null, unit: null, instrument: 'gauge' as const };

/** What `line OK` would gauge: the unread sizes of the line under the cursor. */
export function unreadOfLine(state: RoundState): Spot[] {
  const lineId = state.spot?.lineId;
  return lineId === undefined
    ? []
    : listUnread(state.plan.rubric, recordOf(state)).filter((spot) => spot.lineId === lineId);
}

export function gaugeLine(state: RoundState, mint: Mint): Outcome {
  const label = state.spot && findPiece(state.plan.rubric, state.spot)?.line.label;
  return gauge(state, mint, unreadOfLine(state), `${label ?? 'line'}, line OK`);
}

export function gaugeRest(state: RoundState, mint: Mint): Outcome {
  return gauge(state, mint, listUnread(state.plan.rubric, recordOf(state)), 'rest OK');
}

function gauge(state: RoundState, mint: Mint, spots: readonly Spot[], label: string): Outcome {
  if (spots.length === 0) return refused(state, 'Nothing here is left to gauge.');
  const made = spots.map(({ lineId, ordinal, axis }) =>
    makeEvent(state, mint, { lineId, ordinal, what: axis }, GAUGED, BY_GAUGE),
  );
  const text = made.length === 1 ? 'One size gauged.' : `${made.length} sizes gauged.`;
  return advance(
    recorded(state, mint, made, label, { said: { kind: 'did', text }, sound: 'in' }),
    state.spot,
  );
}

/** Every check that nobody recorded, of the pieces that are there and of the work, set to its first level. */
export function passChecks(state: RoundState, mint: Mint): Outcome {
  const cells = openCheckCells(state);
  if (cells.length === 0) return refused(state, 'Every check is recorded.');
  const made = cells.map((cell) => makeEvent(state, mint, cell, { kind: 'level', level: 0 }));
  return recorded(state, mint, made, 'all good', {
    said: { kind: 'did', text: 'All other checks are good.' },
    sound: 'in',
  });
}

export function openCheckCells(state: RoundState) {
  const { rubric } = state.plan;
  const record = recordOf(state);
  const ofPieces = listPieces(rubric)
    .filter(({ line, ordinal }) => pieceStateAt(record, { lineId: line.id, ordinal }) === 'present')
    .flatMap(({ line, ordinal }) => line.checks.map(({ id }) => ({ lineId: line.id, ordinal, what: id })));
  const ofWork = rubric.workChecks.map(({ id }) => ({ lineId: '', ordinal: 0, what: id }));
  return [...ofPieces, ...ofWork].filter((cell) => valueAt(record, cell) === null);
}

/** The level of one check of the piece, or of the work, that the open choice is about. */
export function setCheck(state: RoundState, mint: Mint, checkId: string, level: number): Outcome {
  const { asked, plan } = state;
  if (asked?.about !== 'checks' && asked?.about !== 'work') return refused(state, 'Tap a checks cell first.');
  const place = asked.about === 'checks' ? findPiece(plan.rubric, asked) : undefined;
  const checks = asked.about === 'work' ? plan.rubric.workChecks : place?.line.checks;
  const check = checks?.find(({ id }) => id === checkId);
  const chosen = check?.levels[level];
  if (!check || !chosen) return refused(state, 'There is no such check here.');
  const cell =
    asked.about === 'checks'
      ? { lineId: asked.lineId, ordinal: asked.ordinal, what: checkId }
      : { lineId: '', ordinal: 0, what: checkId };
  if (valueAt(recordOf(state), cell) === 'conflict' && !plan.maySettle) {
    return refused(state, 'Two readings stand here: the teacher chooses between them.');
  }
  const label = place?.label ?? 'work';
  return recorded(
    state,
    mint,
    [makeEvent(state, mint, cell, { kind: 'level', level })],
    `${label}, ${check.label}`,
    {
      said: { kind: 'did', text: `${label}, ${check.label}: ${chosen.label}.` },
      sound: chosen.lose === 0 ? 'in' : 'off',
    },
  );
}
