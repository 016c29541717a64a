'use client';

import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
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

interface RuleRowProps extends RuleEffectProps {
  /** The field that a finding may stand at. */
  path?: string;
  children: ReactNode;
}

/** A field of a rule, and hung from it by a leader what the rule does. */
export function RuleRow({ effects, rule, path, children }: RuleRowProps) {
  const { findings } = useEditor();
  // A finding needs the width of the column; what the rule does stands below it then.
  const wide = !findings.some((finding) => finding.path === path);
  return (
    <div className="@container">
      <div
        className={classNames('grid gap-x-3 gap-y-2', wide && '@min-[27rem]:grid-cols-[13rem_minmax(0,1fr)]')}
      >
        <div className="min-w-0">{children}</div>
        <div className={classNames('relative pl-8', wide && '@min-[27rem]:pt-9')}>
          <span
            aria-hidden
            className={classNames(
              'absolute -top-1 left-2 h-4 w-4 border-b border-l border-ink',
              wide &&
                '@min-[27rem]:top-9 @min-[27rem]:left-0 @min-[27rem]:h-[11px] @min-[27rem]:w-6 @min-[27rem]:border-l-0',
            )}
          />
          <RuleEffect effects={effects} rule={rule} />
        </div>
      </div>
    </div>
  );
}
