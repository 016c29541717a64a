import type { Unit } from '@/lib/length';
import type { Axis, Band, Check, Points, SizeRule } from '@/lib/scoring';
import type { CutListLine, LineException, RubricForm } from '@/lib/scoring/rubric-form';
import { lengthAsTyped, pointsAsTyped, shareAsTyped } from './as-typed';
import type { DraftCheck, DraftLine, DraftSizeRule, PracticalDraft } from './draft';
import type { Task } from './task';

/** A published task and rubric form as a draft again: reading it back gives the same task, form and rubric. */
export function draftOf(task: Task, form: RubricForm): PracticalDraft {
  const { unit } = form;
  const length = (ticks: number | null) => (ticks === null ? '' : lengthAsTyped(ticks, unit));
  const { defaults, policies } = form;
  return {
    format: 1,
    title: task.title,
    unit,
    instructions: task.instructions,
    material: task.material,
    blank: {
      thickness: length(task.blank?.thickness ?? null),
      width: length(task.blank?.width ?? null),
      length: length(task.blank?.length ?? null),
    },
    kerf: length(task.kerf),
    lines: task.cutList.lines.map((line) =>
      lineOf(line, task.lineNotes[line.id] ?? '', form.exceptions[line.id] ?? {}, unit),
    ),
    all: {
      worth: pointsAsTyped(defaults.worth),
      missing: optionalPoints(defaults.missing),
      sizes: {
        thickness: sizeRuleOf(defaults.sizes.thickness, unit),
        width: sizeRuleOf(defaults.sizes.width, unit),
        length: sizeRuleOf(defaults.sizes.length, unit),
      },
      checks: checksOf(defaults.checks),
      swap: defaults.swap,
      set: defaults.set,
    },
    workChecks: checksOf(form.workChecks),
    total: {
      basis: form.basis,
      start: optionalPoints(form.start),
      outOf: optionalPoints(form.outOf),
      roundTo: pointsAsTyped(form.roundTo),
      floor: String(form.floor),
      ceiling: String(form.ceiling),
    },
    reading: {
      margin: length(form.margin),
      readTo: length(form.readTo),
      grossLimit: length(form.grossLimit),
    },
    late: {
      perDay: policies.late ? String(policies.late.perDay) : '',
      max: policies.late ? String(policies.late.max) : '',
    },
    redo: redoOf(policies.redo),
    prediction: predictionOf(policies.prediction, unit),
    presets: [...form.presets],
  };
}

function optionalPoints(points: Points | null): string {
  return points === null ? '' : pointsAsTyped(points);
}

function lineOf(line: CutListLine, note: string, exception: LineException, unit: Unit): DraftLine {
  const { worth, missing, sizes, checks, swap, set } = exception;
  const sizeOf = (axis: Axis) => {
    const rule = sizes?.[axis];
    return rule ? sizeRuleOf(rule, unit) : null;
  };
  return {
    id: line.id,
    label: line.label,
    quantity: String(line.quantity),
    thickness: lengthAsTyped(line.target.thickness, unit),
    width: lengthAsTyped(line.target.width, unit),
    length: lengthAsTyped(line.target.length, unit),
    note,
    worth: worth === undefined ? '' : pointsAsTyped(worth),
    missing: missing === undefined ? '' : missing === null ? 'worth' : pointsAsTyped(missing),
    sizes: { thickness: sizeOf('thickness'), width: sizeOf('width'), length: sizeOf('length') },
    checks: checks ? checksOf(checks) : null,
    swap: swap ?? null,
    set: set ?? null,
  };
}

/** A price of error as its typed fields; mirrored where both sides say the same. */
export function sizeRuleOf(rule: SizeRule, unit: Unit): DraftSizeRule {
  const side = (bands: readonly Band[], beyond: Points) => ({
    bands: bands.map(({ within, lose }) => ({
      within: lengthAsTyped(within, unit),
      lose: pointsAsTyped(lose),
    })),
    beyond: pointsAsTyped(beyond),
  });
  const over = side(rule.over, rule.beyondOver);
  const under = side(rule.under, rule.beyondUnder);
  return {
    mirrored: JSON.stringify(over) === JSON.stringify(under),
    over,
    under,
    cap: optionalPoints(rule.cap),
  };
}

function checksOf(checks: readonly Check[]): DraftCheck[] {
  return checks.map(({ id, label, levels, assume }) => ({
    id,
    label,
    levels: levels.map((level) => ({ label: level.label, lose: pointsAsTyped(level.lose) })),
    assume,
  }));
}

/** The kinds of redo keep each other's fields, so that choosing another and back loses nothing. */
function redoOf(redo: RubricForm['policies']['redo']): PracticalDraft['redo'] {
  return redo.kind === 'average'
    ? { kind: 'average', capPercent: '90', roundTo: pointsAsTyped(redo.roundTo) }
    : { kind: redo.kind, capPercent: String(redo.capPercent), roundTo: '1' };
}

function predictionOf(
  policy: RubricForm['policies']['prediction'],
  unit: Unit,
): PracticalDraft['prediction'] {
  return {
    agreeWithin: lengthAsTyped(policy.agreeWithin, unit),
    agreeShare: shareAsTyped(policy.agreeShare),
    caughtShare: shareAsTyped(policy.caughtShare),
    valueShare: shareAsTyped(policy.valueShare),
    full: pointsAsTyped(policy.full),
    closeWithin: pointsAsTyped(policy.closeWithin),
    close: pointsAsTyped(policy.close),
  };
}
