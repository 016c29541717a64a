'use client';

import { RuleButtons } from '@/components/rule/rule-buttons';
import { findPiece } from '@/lib/round/pieces';
import { graduationText, ruleScale } from '@/lib/round/rule-scale';
import { useBench } from './bench-context';
import { CaliperEntry } from './caliper-entry';
import { ChoicePanel } from './choice-panel';
import { KeypadEntry } from './keypad-entry';
import { useWide } from './use-wide';

/** The lower half of the bench: the way of entry, or the choice that the last tap opened. */
export function EntryZone() {
  const { view, settings } = useBench();
  const { asked } = view.state;
  if (asked) return <ChoicePanel asked={asked} />;
  if (settings.entry === 'caliper') return <CaliperEntry />;
  return settings.entry === 'rule' ? <RuleEntry /> : <KeypadEntry />;
}

/** The rule as input; sizes whose bands no strip of eleven graduations can hold get the keypad. */
function RuleEntry() {
  const { view, press, change } = useBench();
  const wide = useWide();
  const { spot, plan } = view.state;
  const { rubric } = plan;
  const place = spot && findPiece(rubric, spot);
  const scale = place && spot ? ruleScale(rubric, place.line, spot.axis) : null;
  if (!spot || !place || !scale || !wide)
    return <KeypadEntry why={spot && wide ? 'no rule shows this size’s bands' : undefined} />;
  const { axis } = spot;
  return (
    <section aria-label="read on the rule" className="lg:-mt-1">
      <RuleButtons
        key={`${view.state.attemptId}/${place.line.id}/${axis}`}
        rule={place.line.sizes[axis]}
        margin={rubric.margin}
        unit={rubric.unit}
        target={place.line.target[axis]}
        graduation={scale.step}
        span={5}
        label={`${place.label}, ${axis}`}
        onReading={(ticks) =>
          press({
            do: 'read',
            reading: {
              ticks,
              typed: graduationText(ticks, rubric.unit),
              unit: rubric.unit,
              instrument: 'rule',
            },
          })
        }
        onFar={() => change({ entry: 'keypad' })}
      />
    </section>
  );
}
