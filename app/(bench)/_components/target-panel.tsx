'use client';

import { PartDrawing } from '@/components/part/part-drawing';
import { Fraction } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import { findPiece, listPieces } from '@/lib/round/pieces';
import { useBench } from './bench-context';
import { SaidLine } from './said-line';

/** Roomy for up to seven pieces beside it; smaller for eight and nine. */
const ROOMY = 7;

/** The size to be read now, as large as a metre's distance asks, and the piece with the instrument on it. */
export function TargetPanel() {
  const { view } = useBench();
  const { state } = view;
  const { rubric } = state.plan;
  const place = state.spot && findPiece(rubric, state.spot);
  const columns = Math.min(listPieces(rubric).length, 9);
  if (!state.spot || !place) return <AllRead />;
  const { axis } = state.spot;
  const parts = lengthParts(place.line.target[axis], rubric.unit);
  const roomy = columns <= ROOMY;
  const width = 1144 - 78 - 8 - columns * 78;
  const drawing = roomy ? { width: 500, height: 330 } : { width: Math.max(width, 340), height: 252 };
  return (
    <section aria-label="the size to read" className="relative flex min-w-0 flex-1 flex-col">
      <div className="text-right">
        <p className="narrow text-[27px] leading-8 font-[640]">
          {place.label}, <span className="text-act">{axis}</span>
        </p>
        <p
          className="font-[640] font-stretch-[88%] leading-[0.86]"
          style={{ fontSize: `${targetSize(parts, roomy ? Math.min(width, 470) : width)}px` }}
        >
          <Fraction parts={parts} />
        </p>
      </div>
      <div className={roomy ? '-mt-[88px] w-full max-w-[500px] lg:self-start' : 'mt-1 w-full'}>
        <PartDrawing
          size={place.line.target}
          unit={rubric.unit}
          axis={axis}
          note
          label={place.label}
          {...drawing}
        />
      </div>
      <SaidLine />
    </section>
  );
}

const LARGEST = 164;

/** As large as fits: about 0.56 em a digit, and 0.9 em for a fraction's. */
function targetSize({ whole, num, den }: ReturnType<typeof lengthParts>, room: number): number {
  const fraction = num === null ? 0 : 0.36 * (String(num).length + String(den).length) + 0.3;
  const ems = 0.56 * whole.replace('.', '').length + (whole.includes('.') ? 0.28 : 0) + fraction;
  return Math.round(Math.min(LARGEST, room / Math.max(ems, 0.5)));
}

function AllRead() {
  const { view } = useBench();
  return (
    <section aria-label="the size to read" className="flex min-w-0 flex-1 flex-col items-end text-right">
      <p className="font-title text-title">Every size is read.</p>
      <p className="mt-1 max-w-[22rem] text-lead text-ink-2">
        {view.state.plan.mayFinish ? 'Set the checks, then finish.' : 'Set the checks, then go on.'} Tap a
        size to read it again.
      </p>
      <div className="flex-1" />
      <SaidLine />
    </section>
  );
}
