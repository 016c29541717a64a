'use client';

import { PhraseText } from '@/components/ui/phrase-text';
import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { useEditor } from './editor-context';

/** What a rule of the whole makes of an example now; nothing while the draft cannot be priced. */
export function RuleEffect({ effects, rule }: { effects: RuleEffects | null; rule: keyof RuleEffects }) {
  const { unit } = useEditor();
  const phrase = effects?.[rule] ?? [];
  if (phrase.length === 0) return null;
  return (
    <p
      data-effect={rule}
      className="max-w-[52ch] border-l-edge border-ink pl-3 text-label font-[560] first-letter:uppercase"
    >
      <PhraseText phrase={phrase} unit={unit} />
    </p>
  );
}
