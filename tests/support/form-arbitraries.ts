import fc from 'fast-check';
import { TICKS_PER_INCH } from '@/lib/length';
import type { Check, CutList, LineException, PresetId, RubricForm } from '@/lib/scoring';
import { sizeRuleArb } from './scoring-arbitraries';

const pointsArb = fc.oneof(fc.integer({ min: 0, max: 2000 }), fc.constantFrom(0, 50, 100, 900));
const percentArb = fc.integer({ min: 0, max: 100 });
const roundToArb = fc.constantFrom(100, 50, 10, 1);
const lengthArb = fc.oneof(
  fc.integer({ min: 1, max: 64 }).map((count) => (count * TICKS_PER_INCH) / 128),
  fc.integer({ min: 1, max: 100_000_000 }),
);
/** In lowest terms, as a share is read. */
const shareArb = fc.constantFrom(
  { num: 9, den: 10 },
  { num: 2, den: 3 },
  { num: 1, den: 2 },
  { num: 1, den: 1 },
);

const scaleArb = fc.constantFrom(1, 1_000_000, TICKS_PER_INCH / 128);
const ruleArb = scaleArb.chain(sizeRuleArb).map((rule) => ({ ...rule, cap: null }));

const checksArb: fc.Arbitrary<Check[]> = fc
  .array(fc.array(pointsArb, { minLength: 0, maxLength: 3 }), { maxLength: 3 })
  .map((all) =>
    all.map((loses, index) => ({
      id: `check-${index + 1}`,
      label: `check ${index + 1}`,
      levels: [0, ...loses].map((lose, place) => ({ label: `level ${place}`, lose })),
      assume: index % 2 === 0 ? 0 : null,
    })),
  );

const defaultsArb = fc.record({
  worth: pointsArb,
  missing: fc.option(pointsArb),
  sizes: fc.record({ thickness: ruleArb, width: ruleArb, length: ruleArb }),
  checks: checksArb,
  swap: fc.boolean(),
  set: fc.constantFrom('each' as const, 'worst' as const),
});

const exceptionArb: fc.Arbitrary<LineException> = fc.record(
  {
    worth: pointsArb,
    missing: fc.option(pointsArb),
    sizes: fc.oneof(
      fc.record({ length: ruleArb }),
      fc.record({ thickness: ruleArb, width: ruleArb, length: ruleArb }),
    ),
    checks: checksArb,
    swap: fc.boolean(),
    set: fc.constantFrom('each' as const, 'worst' as const),
  },
  { requiredKeys: ['worth'] },
);

/** Forms a teacher could author for the cut list, with exceptions for some of its lines. */
export function formArb({ lines }: CutList): fc.Arbitrary<RubricForm> {
  const exceptionsArb = fc
    .tuple(...lines.map(({ id }) => fc.option(exceptionArb).map((exception) => [id, exception] as const)))
    .map((pairs) =>
      Object.fromEntries(pairs.flatMap(([id, exception]) => (exception ? [[id, exception]] : []))),
    );
  return fc
    .record({
      format: fc.constant(1 as const),
      unit: fc.constantFrom('in' as const, 'mm' as const),
      basis: fc.constantFrom('worth' as const, 'start' as const),
      outOf: fc.option(fc.integer({ min: 1, max: 1_000_000 })),
      floor: percentArb,
      roundTo: roundToArb,
      readTo: fc.option(lengthArb),
      margin: fc.oneof(fc.constant(0), lengthArb),
      grossLimit: fc.option(lengthArb),
      ceiling: fc.integer({ min: 100, max: 200 }),
      presets: fc.constant<PresetId[]>([]),
      defaults: defaultsArb,
      exceptions: exceptionsArb,
      workChecks: checksArb,
      policies: fc.record({
        late: fc.option(
          fc.tuple(percentArb, percentArb).map(([a, b]) => ({ perDay: Math.min(a, b), max: Math.max(a, b) })),
        ),
        redo: fc.oneof(
          fc.record({ kind: fc.constantFrom('higher' as const, 'latest' as const), capPercent: percentArb }),
          fc.record({ kind: fc.constant('average' as const), roundTo: roundToArb }),
        ),
        prediction: fc.record({
          agreeWithin: lengthArb,
          agreeShare: shareArb,
          caughtShare: shareArb,
          valueShare: shareArb,
          full: pointsArb,
          closeWithin: pointsArb,
          close: pointsArb,
        }),
      }),
    })
    .chain((form) =>
      fc
        .integer({ min: 1, max: 1_000_000 })
        .map((start) => ({ ...form, start: form.basis === 'start' ? start : null })),
    );
}
