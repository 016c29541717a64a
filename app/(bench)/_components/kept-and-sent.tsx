'use client';

import { classNames } from '@/components/ui/class-names';
import { useBench } from './bench-context';

/** How many readings this tablet has kept and the server has; a tally stroke for each that is still on the way. */
export function KeptAndSent() {
  const { view, panel, open, practice } = useBench();
  const { kept, sent } = view.counts;
  const trouble = view.parked.length > 0 || view.failure !== null || view.sending.state === 'halted';
  return (
    <button
      type="button"
      onClick={() => open('kept')}
      aria-expanded={panel === 'kept'}
      className={classNames(
        'grid min-h-14 w-[164px] grid-cols-[auto_auto_1fr] content-center items-center gap-x-2 border-rule px-3 text-left select-none max-lg:border-t lg:border-l active:bg-ink active:text-sheet',
        panel === 'kept' && 'bg-ink text-sheet',
        trouble && panel !== 'kept' && 'bg-refuse-wash text-refuse',
      )}
    >
      <span className="text-label">kept</span>
      <span className="tnum text-right text-lead leading-6 font-[660]" data-testid="kept">
        {kept}
      </span>
      <Tally count={kept - sent} hidden={practice} />
      <span className="text-label">sent</span>
      <span className="tnum text-right text-lead leading-6 font-[660]" data-testid="sent">
        {sent}
      </span>
      <span className="narrow text-label whitespace-nowrap">{wordFor(view, practice)}</span>
    </button>
  );
}

function wordFor(view: ReturnType<typeof useBench>['view'], practice: boolean): string {
  if (view.failure !== null) return 'not kept';
  if (practice) return 'thrown away';
  if (view.parked.length > 0) return `${view.parked.length} refused`;
  if (view.sending.state === 'halted') return view.sending.why === 'sign-in' ? 'sign in' : 'look here';
  return view.counts.kept > view.counts.sent ? 'to send' : 'all sent';
}

const MOST_STROKES = 10;

/** Strokes in fives, the fifth across. */
function Tally({ count, hidden }: { count: number; hidden: boolean }) {
  if (hidden || count <= 0) return <span />;
  const strokes = Math.min(count, MOST_STROKES);
  return (
    <svg aria-hidden="true" width={58} height={20} viewBox="0 0 58 20" className="stroke-current">
      {Array.from({ length: strokes }, (_, index) => {
        const group = Math.floor(index / 5) * 28;
        const nth = index % 5;
        const d = nth === 4 ? `M${group} 15L${group + 22} 5` : `M${group + 3 + nth * 5} 2V18`;
        return <path key={d} d={d} className="[stroke-width:var(--pen-outline)]" />;
      })}
    </svg>
  );
}
