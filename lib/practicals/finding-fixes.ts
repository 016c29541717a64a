import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';
import { AXES, type Points, type Rubric } from '@/lib/scoring';
import { mostOfPresent } from '@/lib/scoring/review/most-lost';
import { loseByDearestHalf } from '@/lib/scoring/review/review-totals';
import { lengthAsTyped, pointsAsTyped } from './as-typed';
import type { DraftSizeRule, PracticalDraft } from './draft';
import { sizeRuleOf } from './draft-of';
import { readPoints } from './field-reader';
import { readSizeRule } from './parse-size-rule';
import type { RubricFinding } from './place-findings';
import { doubleSide } from './presets';

/** One press that settles a finding. */
export interface FindingFix {
  label: string;
  /** Types it into a copy of the draft. */
  apply(draft: PracticalDraft): void;
}

/** What the press is about, where several findings stand at one field: the greatest settles them all. */
type Amount = number;

interface FixRule {
  /** What this finding needs; null: no press settles it. */
  amountOf(finding: RubricFinding, rubric: Rubric): Amount | null;
  fix(path: string, amount: Amount, on: { draft: PracticalDraft; rubric: Rubric }): FindingFix | null;
}

const ROUNDINGS: Points[] = [50, 10, 1];
/** Free distances that a rule shows, widest first. */
const FREE: Record<Unit, Length[]> = {
  in: [32, 64, 128].map((parts) => TICKS_PER_INCH / parts),
  mm: [2, 5, 10, 20].map((parts) => TICKS_PER_MM / parts),
};

const lineOf = (rubric: Rubric, { lineId }: RubricFinding) => rubric.lines.find(({ id }) => id === lineId);

function sizeOf(rubric: Rubric, finding: RubricFinding) {
  return finding.axis ? lineOf(rubric, finding)?.sizes[finding.axis] : undefined;
}

/** The price at a path and, where all lines' sizes are alike, the two that are changed together with it. */
function pricesAt(draft: PracticalDraft, path: string): DraftSizeRule[] {
  const [first, index, , last] = path.split('.');
  if (first === 'all') {
    const axis = AXES.find((each) => path.endsWith(`.${each}`));
    const text = axis ? JSON.stringify(draft.all.sizes[axis]) : '';
    return AXES.map((each) => draft.all.sizes[each]).filter((rule) => JSON.stringify(rule) === text);
  }
  const axis = AXES.find((each) => each === last);
  const rule = axis ? draft.lines[Number(index)]?.sizes[axis] : null;
  return rule ? [rule] : [];
}

const SIDES = ['over', 'under'] as const;

/** Makes what lies past the last band cost at least this, and lifts a limit that would hide it. */
function raiseBeyond(rule: DraftSizeRule, least: Points): void {
  const typed = pointsAsTyped(least);
  for (const side of SIDES) if ((readPoints(rule[side].beyond) ?? 0) < least) rule[side].beyond = typed;
  const cap = readPoints(rule.cap);
  if (cap !== null && cap < least) rule.cap = typed;
}

/** The widest free distance short of the next band; null where that one is too near. */
function freeBefore(rule: DraftSizeRule, unit: Unit): Length | null {
  const read = readSizeRule(rule, unit);
  const next = read ? SIDES.flatMap((side) => read[side][1]?.within ?? []) : [];
  return FREE[unit].find((free) => next.every((within) => free < within)) ?? null;
}

const FIXES: Record<string, FixRule> = {
  'no-free-band': {
    amountOf: () => 0,
    fix(path, _, { draft }) {
      const [first] = pricesAt(draft, path);
      const distance = first ? freeBefore(first, draft.unit) : null;
      if (distance === null) return null;
      const free = lengthAsTyped(distance, draft.unit);
      return {
        label: `make the first band ${free}`,
        apply(next) {
          for (const rule of pricesAt(next, path)) {
            for (const { bands } of SIDES.map((side) => rule[side])) {
              if (bands[0] && readsZero(bands[0].within)) bands[0].within = free;
            }
          }
        },
      };
    },
  },
  'one-wrong-keeps-most': {
    amountOf: (finding, rubric) => Math.ceil((lineOf(rubric, finding)?.worth ?? 0) / 4),
    fix: (path, least) => ({
      label: `let it lose ${pointsAsTyped(least)} past the last band`,
      apply: (next) => {
        for (const rule of pricesAt(next, path)) raiseBeyond(rule, least);
      },
    }),
  },
  'missing-is-cheaper': {
    amountOf(finding, rubric) {
      const line = lineOf(rubric, finding);
      return line ? mostOfPresent(line, rubric) * (line.set === 'worst' ? line.quantity : 1) : null;
    },
    fix(path, most, { rubric }) {
      const index = Number(path.split('.')[1]);
      const worths = path.startsWith('all.') ? rubric.lines : rubric.lines.slice(index, index + 1);
      const isWorth = worths.every(({ worth }) => worth === most);
      const typed = isWorth ? 'worth' : pointsAsTyped(most);
      return {
        label: isWorth ? 'set it to the worth' : `set it to ${typed}`,
        apply: (next) => {
          const holder = path.startsWith('all.') ? next.all : next.lines[index];
          if (holder) holder.missing = typed;
        },
      };
    },
  },
  'rounding-and-margin': {
    amountOf: () => 0,
    fix: () => ({
      label: 'score as read, without rounding',
      apply: (next) => {
        next.reading.readTo = '';
      },
    }),
  },
  'symmetric-undersize': {
    amountOf: () => 0,
    fix: (path) => ({
      label: 'make under twice as dear',
      apply(next) {
        for (const rule of pricesAt(next, path)) {
          const read = readSizeRule(rule, next.unit);
          const doubled = read && doubleSide(read, 'under', next.unit);
          if (doubled) Object.assign(rule, sizeRuleOf(doubled, next.unit));
        }
        if (!next.presets.includes('undersize-doubles')) next.presets.push('undersize-doubles');
      },
    }),
  },
  'gross-inside-band': {
    amountOf(finding, rubric) {
      const size = sizeOf(rubric, finding);
      return size ? Math.max(...[...size.over, ...size.under].map(({ within }) => within)) : null;
    },
    fix: (_, reach, { draft: { unit } }) => ({
      label: `set the gross limit to ${lengthAsTyped(reach, unit)}`,
      apply: (next) => {
        next.reading.grossLimit = lengthAsTyped(reach, unit);
      },
    }),
  },
  'total-off-grid': {
    amountOf(_, rubric) {
      const worth = rubric.lines.reduce((sum, line) => sum + line.worth * line.quantity, 0);
      const possible = rubric.start ?? worth;
      const whole = [possible, rubric.outOf ?? possible];
      return ROUNDINGS.find((step) => whole.every((points) => points % step === 0)) ?? null;
    },
    fix: (_, step) => ({
      label: `round to ${pointsAsTyped(step)}`,
      apply: (next) => {
        next.total.roundTo = pointsAsTyped(step);
      },
    }),
  },
  'start-runs-out': {
    amountOf: (_, rubric) => loseByDearestHalf(rubric).lost,
    fix: (_, lost) => ({
      label: `start from ${pointsAsTyped(lost)}, scaled to what it was`,
      apply: ({ total }) => {
        total.outOf = total.outOf.trim() === '' ? total.start : total.outOf;
        total.start = pointsAsTyped(lost);
      },
    }),
  },
};

function readsZero(text: string): boolean {
  return /^[0.,/ ]*$/.test(text.trim().replace(/ ?(in|mm|")$/i, ''));
}

/** The one press that settles all findings of a code at a field; null where what to do is not that clear. */
export function fixOf(
  path: string,
  findings: readonly RubricFinding[],
  draft: PracticalDraft,
  rubric: Rubric,
): FindingFix | null {
  const rule = FIXES[findings[0]?.code ?? ''];
  const amounts = findings.flatMap((finding) => rule?.amountOf(finding, rubric) ?? []);
  return rule && amounts.length > 0 ? rule.fix(path, Math.max(...amounts), { draft, rubric }) : null;
}
