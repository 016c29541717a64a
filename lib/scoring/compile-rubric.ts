import type { CutList, CutListLine, LineDefaults, LineException, RubricForm } from './rubric-form';
import type { Line, Rubric, SizeRule } from './types';

/**
 * Compiles an authored form and its cut list to the price list that scoring works by. Lines stand in cut-list order;
 * an exception replaces the default it names, an axis it does not name is priced as all lines are, and `missing` null
 * means the line's worth. Exceptions for lines that the cut list does not have are without effect. Lengths in ticks,
 * points in hundredths; nothing is rounded. Deterministic, mutates nothing and shares nothing with its input; what no
 * rubric may hold is refused by `rubricSchema`, not here.
 *
 * @example
 * compileRubric(defaultRubricForm('in'), cutList).lines[0].worth // 900
 */
export function compileRubric(form: RubricForm, cutList: CutList): Rubric {
  const { unit, basis, start, outOf, floor, roundTo, readTo, margin, grossLimit, ceiling } = form;
  return structuredClone({
    ...{ unit, basis, start, outOf, floor, roundTo, readTo, margin, grossLimit },
    lines: cutList.lines.map((line) => compileLine(line, form.defaults, exceptionOf(form, line.id))),
    workChecks: form.workChecks,
    late: form.policies.late,
    ceiling,
  });
}

function exceptionOf(form: RubricForm, lineId: string): LineException {
  return (Object.hasOwn(form.exceptions, lineId) ? form.exceptions[lineId] : undefined) ?? {};
}

function compileLine(line: CutListLine, all: LineDefaults, own: LineException): Line {
  const worth = own.worth ?? all.worth;
  const missing = own.missing === undefined ? all.missing : own.missing;
  return {
    id: line.id,
    label: line.label,
    quantity: line.quantity,
    target: line.target,
    worth,
    missing: missing ?? worth,
    sizes: compileSizes(all.sizes, own.sizes ?? {}),
    checks: own.checks ?? all.checks,
    swap: own.swap ?? all.swap,
    set: own.set ?? all.set,
  };
}

function compileSizes(
  all: LineDefaults['sizes'],
  own: Partial<LineDefaults['sizes']>,
): Record<'thickness' | 'width' | 'length', SizeRule> {
  return {
    thickness: own.thickness ?? all.thickness,
    width: own.width ?? all.width,
    length: own.length ?? all.length,
  };
}
