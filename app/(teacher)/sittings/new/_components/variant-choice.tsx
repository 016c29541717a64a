import { Segmented } from '@/components/ui/segmented';
import type { VariantFamily, VariantMember } from '@/lib/data/sittings/variant-families';

interface VariantChoiceProps {
  family: VariantFamily;
  /** What the chosen period can still be given. */
  open: readonly { practicalId: string }[];
  versionId: string | undefined;
  onChoose(versionId: string): void;
}

/** The sizes that there are of the chosen practical, and which of one’s other periods have which. */
export function VariantChoice({ family, open, versionId, onChoose }: VariantChoiceProps) {
  const free = new Set(open.map(({ practicalId }) => practicalId));
  return (
    <div>
      <Segmented
        label="sizes"
        showLabel
        tone="act"
        value={versionId ?? ''}
        options={family.members
          .filter(({ practicalId }) => free.has(practicalId))
          .map((member) => ({ value: member.versionId, label: member.name }))}
        onChange={onChoose}
      />
      <ul className="mt-2 text-label" aria-label="who has which sizes">
        {family.members.map((member) => (
          <li key={member.practicalId} className="flex justify-between gap-4 border-b border-hair py-1">
            <span className={member.versionId === versionId ? 'font-[640]' : ''}>{member.name}</span>
            <span className={member.periods.length > 0 ? '' : 'text-ink-2'}>{sayPeriods(member)}</span>
          </li>
        ))}
      </ul>
      <p className="mt-1 text-label text-ink-2">
        Give neighbouring periods different sizes: a borrowed piece then does not fit.
      </p>
    </div>
  );
}

function sayPeriods({ periods }: VariantMember): string {
  if (periods.length === 0) return 'none of your periods has it';
  return `${periods.length === 1 ? 'period' : 'periods'} ${periods.join(', ')}`;
}
