import type { ResultRow } from '@/db/queries/publications';
import { scoreSheetSchema } from '@/lib/contracts/results';
import { decimalLength } from '@/lib/csv/decimal-length';
import { type CsvCell, hundredthsAsDecimal } from '@/lib/csv/write-csv';
import { pieceLabel } from '@/lib/practicals/task';
import { AXES, type Axis, type PieceSheet, type Points, type SizeSheet } from '@/lib/scoring';
import type { LoadedSitting, LoadedVersion } from './load-gradebook';
import { localTime } from './local-time';
import type { PlainSheets } from './plain-sheets';

export interface ExportSection {
  period: string;
  termName: string;
  timeZone: string;
}

export interface CsvTable {
  header: readonly string[];
  rows: CsvCell[][];
}

const WHO = ['local ID', 'family name', 'given name', 'period', 'term', 'practical', 'attempt'] as const;

const GRADES = [...WHO, 'status', 'score', 'out of', 'percent', 'predicted', 'measured at', 'rubric version'];

const SIZES = [
  ...WHO,
  'piece',
  'axis',
  'target',
  'reading',
  'deviation',
  'unit',
  'band',
  'points',
  'rubric version',
];

interface Published {
  result: ResultRow;
  who: CsvCell[];
  version: LoadedVersion;
}

/** One row a student and attempt, as last published. Blank numbers where the status is none. */
export function gradesTable(section: ExportSection, sittings: readonly LoadedSitting[]): CsvTable {
  const rows = publishedOf(section, sittings).map(({ result, who, version }) => {
    const { scorePoints: score, totalPoints: total, predictedPoints: predicted } = result;
    const isNumber = score !== null;
    return [
      ...who,
      { text: result.status },
      isNumber ? points(score) : null,
      isNumber ? points(total) : null,
      isNumber && total > 0 ? { decimal: percentOf(score, total) } : null,
      isNumber && predicted !== null ? points(predicted) : null,
      result.measuredAt ? { text: localTime(result.measuredAt, section.timeZone) } : null,
      { decimal: String(version.number) },
    ];
  });
  return { header: GRADES, rows };
}

/**
 * One row a size of every scored attempt, lengths as exact decimals in the rubric's unit. Every student's sizes are
 * priced by the sitting's own rubric, so that a modified one does not show in the file: `plain` has their sheets.
 */
export function sizesTable(
  section: ExportSection,
  sittings: readonly LoadedSitting[],
  plain: PlainSheets,
): CsvTable {
  const rows = publishedOf(section, sittings).flatMap(({ result, who, version }) => {
    const sheet = plain.get(result.attemptId) ?? scoreSheetSchema.nullable().parse(result.sheet);
    return (sheet?.pieces ?? []).flatMap((piece) => sizeRows(version, piece, who));
  });
  return { header: SIZES, rows };
}

/** The results by practical, then by name, ID and attempt: always in the same order. */
function publishedOf(section: ExportSection, sittings: readonly LoadedSitting[]): Published[] {
  return sittings.flatMap(({ title, attempts, latest }) => {
    if (!latest) return [];
    const told = attempts.flatMap((row) => {
      const result = latest.results.get(row.attemptId);
      return result ? [{ row, result }] : [];
    });
    return told
      .sort((a, b) => compare(orderKey(a.row), orderKey(b.row)))
      .map(({ row, result }) => ({
        result,
        version: latest.version,
        who: [
          { text: row.localId ?? '' },
          { text: row.familyName },
          { text: row.givenName },
          { text: section.period },
          { text: section.termName },
          { text: title },
          { decimal: String(row.number) },
        ],
      }));
  });
}

function orderKey(row: {
  familyName: string;
  givenName: string;
  localId: string | null;
  studentId: string;
  number: number;
}): string {
  const { familyName, givenName, localId, studentId, number } = row;
  return [
    familyName.toLowerCase(),
    givenName.toLowerCase(),
    localId ?? '',
    studentId,
    String(number).padStart(3, '0'),
  ].join('\u{1}');
}

/** By code units, so that no server's language settings change a file. */
function compare(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}

function sizeRows({ number, task, rubric }: LoadedVersion, piece: PieceSheet, who: CsvCell[]): CsvCell[][] {
  const line = task.cutList.lines.find(({ id }) => id === piece.lineId);
  if (!line) return [];
  const { unit } = rubric;
  const row = (axis: Axis, size: SizeSheet | null): CsvCell[] => [
    ...who,
    { text: pieceLabel(line, piece.ordinal) },
    { text: axis },
    { decimal: decimalLength(line.target[axis], unit) },
    lengthOrBlank(size?.reading, unit),
    lengthOrBlank(size?.deviation, unit),
    { text: unit },
    size === null ? { text: piece.state } : bandOf(size),
    size === null ? null : points(size.lose),
    { decimal: String(number) },
  ];
  if (piece.state === 'missing') return AXES.map((axis) => row(axis, null));
  // What is not held against a student, and why, is nobody's matter who receives the file; nor is a size that could
  // stay unread for that.
  return AXES.flatMap((axis) => {
    const size = piece.sizes?.[axis];
    return size && size.band !== 'excused' && size.band !== 'unread' ? [row(axis, size)] : [];
  });
}

function lengthOrBlank(ticks: number | null | undefined, unit: 'in' | 'mm'): CsvCell {
  return ticks === null || ticks === undefined ? null : { decimal: decimalLength(ticks, unit) };
}

/** The number of the band, 0 the free one; a word for what is in none. */
function bandOf({ band }: SizeSheet): CsvCell {
  if (typeof band === 'number') return { decimal: String(band) };
  return { text: band };
}

function points(hundredths: Points): CsvCell {
  return { decimal: hundredthsAsDecimal(hundredths) };
}

/** To two decimals, half up. */
function percentOf(score: Points, total: Points): string {
  return hundredthsAsDecimal(Math.floor((score * 20_000 + total) / (2 * total)));
}
