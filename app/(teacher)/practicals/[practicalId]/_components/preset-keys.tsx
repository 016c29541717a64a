'use client';

import { Button } from '@/components/ui/button';
import { ButtonRow } from '@/components/ui/button-row';
import type { Length } from '@/lib/length';
import { sizeRuleOf } from '@/lib/practicals/draft-of';
import { doubleSide, isDoubled } from '@/lib/practicals/presets';
import type { PresetId, SizeRule } from '@/lib/scoring';
import { useEditor } from './editor-context';
import { RateDialog } from './rate-dialog';
import type { SizeRuleDesk } from './use-size-rule';

const DOUBLES: [id: PresetId, dear: 'under' | 'over', label: string][] = [
  ['undersize-doubles', 'under', 'undersize doubles'],
  ['oversize-doubles', 'over', 'oversize doubles'],
];

interface PresetKeysProps {
  size: SizeRuleDesk;
  read: SizeRule | null;
  target: Length;
}

/** Ready-made prices for this size. Pressed again, a doubled side costs what the other one does. */
export function PresetKeys({ size, read, target }: PresetKeysProps) {
  const { desk, unit } = useEditor();
  const notYet = read ? null : 'the bands cannot be read yet';

  function toggle(id: PresetId, dear: 'under' | 'over', pressed: boolean) {
    const doubled = read && doubleSide(read, dear, unit);
    const cheap = dear === 'under' ? 'over' : 'under';
    size.change((rule) => {
      if (!pressed && doubled) Object.assign(rule, sizeRuleOf(doubled, unit));
      else Object.assign(rule, { mirrored: true, over: structuredClone(rule[cheap]), under: rule[cheap] });
    });
    if (!pressed) desk.edit(({ presets }) => void (presets.includes(id) || presets.push(id)));
  }

  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-1 lg:ml-auto">
      <span className="text-label text-ink-2">presets</span>
      <ButtonRow joined label="presets">
        {DOUBLES.map(([id, dear, label]) => {
          const pressed = read !== null && isDoubled(read, dear);
          return (
            <Button
              key={id}
              kind={pressed ? 'pressed' : 'plain'}
              aria-pressed={pressed}
              size="small"
              className="min-h-9"
              notYet={notYet}
              onClick={() => toggle(id, dear, pressed)}
            >
              {label}
            </Button>
          );
        })}
        <RateDialog size={size} target={target} />
      </ButtonRow>
    </div>
  );
}
