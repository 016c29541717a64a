'use client';

import type { ReactNode } from 'react';
import { PhraseText } from '@/components/ui/phrase-text';
import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { useEditor } from './editor-context';

interface RuleEffectProps {
  effects: RuleEffects | null;
  rule: keyof RuleEffects;
}

/** What a rule of the whole makes of an example now; nothing while the draft cannot be priced. */
export function RuleEffect({ effects, rule }: RuleEffectProps) {
  const { unit } = useEditor();
  const phrase = effects?.[rule] ?? [];
  if (phrase.length === 0) return null;
  return (
    <p data-effect={rule} className="max-w-[46ch] text-label font-[560] first-letter:uppercase">
      <PhraseText phrase={phrase} unit={unit} />
    </p>
  );
}

/** A field of a rule, and hung from it by a leader what the rule does. */
export function RuleRow({ effects, rule, children }: RuleEffectProps & { children: ReactNode }) {
  return (
    <div className="@container">
      <div className="grid gap-x-3 gap-y-2 @min-[27rem]:grid-cols-[13rem_minmax(0,1fr)]">
        <div className="min-w-0">{children}</div>
        <div className="relative pl-8 @min-[27rem]:pt-9">
          <span
            aria-hidden
            className="absolute -top-1 left-2 h-4 w-4 border-b border-l border-ink @min-[27rem]:top-9 @min-[27rem]:left-0 @min-[27rem]:h-[11px] @min-[27rem]:w-6 @min-[27rem]:border-l-0"
          />
          <RuleEffect effects={effects} rule={rule} />
        </div>
      </div>
    </div>
  );
}
