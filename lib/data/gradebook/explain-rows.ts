import type { ExplanationView } from '@/lib/contracts/gradebook';
import { explainScore, type LossRow } from '@/lib/practicals/explain-score';
import { pieceLabel, type Task } from '@/lib/practicals/task';
import { AXES, type Axis, type Points, type Rubric, type ScoreSheet, type SizeSheet } from '@/lib/scoring';

type Rows = Pick<
  ExplanationView,
  'rows' | 'free' | 'goodChecks' | 'unread' | 'lost' | 'kept' | 'possible' | 'total' | 'floorGives' | 'rest'
>;

/** A sheet's explanation in words and figures that a page can show; the rows add up as `explainScore` promises. */
export function explainRows(
  task: Task,
  rubric: Rubric,
  sheet: ScoreSheet,
  bonus: Points,
  held: Points = 0,
): Rows {
  const { rows, lost, kept, possible, total, floorGives, rest } = explainScore(rubric, sheet, bonus, held);
  return {
    rows: rows.map((row) => rowOf(task, rubric, row)),
    free: freeSizes(rubric, sheet),
    goodChecks: goodChecks(rubric, sheet),
    unread: sheet.unread.length,
    lost,
    kept,
    possible,
    total,
    floorGives,
    rest,
  };
}

function rowOf(task: Task, rubric: Rubric, row: LossRow): Rows['rows'][number] {
  const line = task.cutList.lines.find(({ id }) => id === row.lineId);
  const axis = AXES.find((name) => name === row.what);
  return {
    kind: row.kind,
    piece: line ? pieceLabel(line, row.ordinal) : '',
    what: whatOf(rubric, row, axis),
    target: line && axis ? line.target[axis] : null,
    reading: row.size?.reading ?? null,
    word: wordOf(row.size),
    deviation: row.size?.deviation ?? null,
    points: row.points,
    ofTotal: row.ofTotal,
  };
}

function whatOf(rubric: Rubric, { kind, lineId, what }: LossRow, axis: Axis | undefined): string {
  if (axis) return axis;
  const checks = kind === 'work' ? rubric.workChecks : rubric.lines.find(({ id }) => id === lineId)?.checks;
  return checks?.find(({ id }) => id === what)?.label ?? what;
}

function wordOf(size: SizeSheet | null): string | null {
  if (!size || size.reading !== null) return null;
  return size.band === 'unread' ? 'not read' : String(size.band);
}

function freeSizes(rubric: Rubric, sheet: ScoreSheet): Rows['free'] {
  const edges = new Set<number>();
  let sizes = 0;
  for (const piece of sheet.pieces) {
    const line = rubric.lines.find(({ id }) => id === piece.lineId);
    for (const axis of AXES) {
      const size = piece.sizes?.[axis];
      if (!line || !size || size.lose > 0 || size.band === 'unread' || size.band === 'excused') continue;
      sizes += 1;
      const { under, over } = line.sizes[axis];
      edges.add(Math.max(under[0]?.within ?? 0, over[0]?.within ?? 0));
    }
  }
  const [edge] = edges;
  return { sizes, within: edges.size === 1 && edge !== undefined ? edge : null };
}

/** The checks that cost nothing on any piece, by their names. */
function goodChecks(rubric: Rubric, sheet: ScoreSheet): string[] {
  const labels = new Map<string, boolean>();
  const note = (label: string, level: number | null, lose: Points) => {
    if (level !== null) labels.set(label, (labels.get(label) ?? true) && lose === 0);
  };
  for (const piece of sheet.pieces) {
    const checks = rubric.lines.find(({ id }) => id === piece.lineId)?.checks ?? [];
    for (const { id, level, lose } of piece.checks) {
      note(checks.find((check) => check.id === id)?.label ?? id, level, lose);
    }
  }
  for (const { id, level, lose } of sheet.work) {
    note(rubric.workChecks.find((check) => check.id === id)?.label ?? id, level, lose);
  }
  return [...labels].flatMap(([label, good]) => (good ? [label] : []));
}
