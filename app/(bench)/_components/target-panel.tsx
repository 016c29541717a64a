'use client';

import { howToHold, instrumentFor } from '@/components/part/instrument';
import { PartDrawing } from '@/components/part/part-drawing';
import { LengthText } from '@/components/ui/fraction';
import { lengthParts } from '@/components/ui/length-parts';
import type { Unit } from '@/lib/length';
import { findPiece, listPieces } from '@/lib/round/pieces';
import type { Axis } from '@/lib/scoring';
import { useBench } from './bench-context';
import { SaidLine } from './said-line';
import { useBenchWidth } from './use-wide';

const PANEL = { labels: 78, gap: 8, column: 78, height: 366 };

/** The size to be read now, as large as a metre's distance asks, and the piece with the instrument on it. */
export function TargetPanel() {
  const { view } = useBench();
  const benchWidth = useBenchWidth();
  const { state } = view;
  const { rubric } = state.plan;
  const place = state.spot && findPiece(rubric, state.spot);
  if (!state.spot || !place) return <AllRead />;
  const { axis } = state.spot;
  const target = place.line.target[axis];
  const columns = Math.min(listPieces(rubric).length, MOST_COLUMNS);
  const width = Math.max(320, benchWidth - PANEL.labels - PANEL.gap - columns * PANEL.column);
  const number = numberOf(lengthParts(target, rubric.unit), Math.min(width, WIDEST_NUMBER));
  const drawn = Math.min(width, WIDEST_DRAWING);
  const heading = `${place.label}, ${axis}`.length * HEADING_LETTER;
  const free = width - Math.max(number.width, heading);
  // The leader of the drawing's own note would run through a number this wide.
  const crowded = free < NOTE_WIDTH;
  return (
    <section aria-label="the size to read" className="relative flex min-w-0 flex-1 flex-col lg:block">
      {crowded && width - number.width > HOLD_WIDTH ? (
        <Hold axis={axis} ticks={target} unit={rubric.unit} />
      ) : null}
      <div className="max-lg:hidden lg:absolute lg:top-0 lg:left-2" style={{ width: drawn }}>
        <PartDrawing
          size={place.line.target}
          unit={rubric.unit}
          axis={axis}
          note={!crowded}
          label={place.label}
          width={drawn}
          height={PANEL.height}
          corner={{
            width: Math.max(0, number.width - (width - drawn)) + 14,
            height: number.size + 22,
          }}
        />
      </div>
      <div className="relative text-right">
        <p className="narrow text-[27px] leading-8 font-[640]">
          {place.label}, <span className="text-act">{axis}</span>
        </p>
        <p
          className="font-[640] font-stretch-[88%] leading-[0.9] max-lg:text-[84px]!"
          style={{ fontSize: `${number.size}px` }}
        >
          <LengthText ticks={target} unit={rubric.unit} display />
        </p>
      </div>
      <div className="lg:absolute lg:inset-x-0 lg:bottom-0">
        <SaidLine />
      </div>
    </section>
  );
}

/** Where to hold the instrument, beside the number; where there is no room for it the drawing alone shows it. */
function Hold({ axis, ticks, unit }: { axis: Axis; ticks: number; unit: Unit }) {
  const [first, second] = howToHold(axis, instrumentFor(ticks, unit));
  return (
    <p aria-hidden="true" className="absolute top-10 left-2 text-label text-ink-2 max-lg:hidden">
      {first}
      <br />
      {second}
    </p>
  );
}

const MOST_COLUMNS = 9;
const NOTE_WIDTH = 190;
const HOLD_WIDTH = 185;
const HEADING_LETTER = 12.2;
const WIDEST_DRAWING = 560;
const WIDEST_NUMBER = 460;
const LARGEST = 164;
/** What a figure takes of the type's size in this cut, and one of a fraction's. */
const FIGURE = 0.5;
const FRACTION_FIGURE = 0.335;
const BAR = 0.06;
const POINT = 0.27;

/** As large as fits the room, and how wide it then is. */
function numberOf({ whole, num, den }: ReturnType<typeof lengthParts>, room: number) {
  const figures = whole.replace('.', '').length * FIGURE + (whole.includes('.') ? POINT : 0);
  const fraction =
    num === null ? 0 : FRACTION_FIGURE * (String(num).length + String(den).length) + BAR + (whole ? 0.1 : 0);
  const ems = Math.max(FIGURE, figures + fraction);
  const size = Math.round(Math.min(LARGEST, room / ems));
  return { size, width: ems * size };
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
