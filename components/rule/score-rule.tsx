import { classNames } from '@/components/ui/class-names';
import { pointsAsText } from '@/components/ui/points-text';
import type { Points } from '@/lib/scoring';
import { CrowsFoot } from './rule-pointers';

interface ScoreRuleProps {
  /** The teacher's figure and one's own, as points. */
  bench: Points | null;
  own: Points | null;
  total: Points;
  benchLabel?: string;
  ownLabel?: string;
  className?: string;
}

const WIDTH = 358;
const EDGE = 32;
const FOOT = 78;
const PAD = 18;
const SHORTEST = 25;

/** A stretch of the score in whole fives that holds every figure and the total. */
export function scoreStretch(total: Points, figures: readonly Points[]): [from: number, to: number] {
  const whole = figures.map((points) => points / 100);
  const to = Math.ceil(Math.max(total / 100, ...whole));
  const lowest = Math.min(to - SHORTEST, ...whole.map((figure) => Math.floor((figure - 1) / 5) * 5));
  return [Math.max(0, Math.floor(lowest / 5) * 5), to];
}

/** The score as a rule: bench and own prediction as pointers on it. */
export function ScoreRule({
  bench,
  own,
  total,
  benchLabel = 'bench',
  ownLabel = 'yours',
  className,
}: ScoreRuleProps) {
  const figures = [bench, own].filter((points) => points !== null);
  const [from, to] = scoreStretch(total, figures);
  const place = (value: number) => PAD + ((value - from) / (to - from)) * (WIDTH - 2 * PAD);
  const marks = Array.from({ length: to - from + 1 }, (_, index) => from + index);
  const thin = to - from > 40;
  const benchFirst = bench !== null && (own === null || bench <= own);
  const words = [
    bench === null ? null : `${benchLabel} ${pointsAsText(bench)}`,
    own === null ? null : `${ownLabel} ${pointsAsText(own)}`,
    `of ${pointsAsText(total)}`,
  ];
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${FOOT + 2}`}
      role="img"
      aria-label={words.filter(Boolean).join(', ')}
      className={classNames('block h-auto w-full', className)}
    >
      <rect
        x={1}
        y={EDGE}
        width={WIDTH - 2}
        height={FOOT - EDGE}
        className="fill-plate stroke-ink [stroke-width:var(--pen-outline)]"
      />
      <path d={`M0 ${EDGE}H${WIDTH}`} className="stroke-ink [stroke-width:var(--pen-edge)]" />
      {marks.map((mark) => (
        <ScoreMark key={mark} mark={mark} x={place(mark)} thin={thin} />
      ))}
      {bench === null ? null : (
        <Figure
          kind="bench"
          x={place(bench / 100)}
          before={benchFirst}
          text={`${benchLabel} ${pointsAsText(bench)}`}
        />
      )}
      {own === null ? null : (
        <Figure
          kind="own"
          x={place(own / 100)}
          before={!benchFirst && bench !== null}
          text={`${ownLabel} ${pointsAsText(own)}`}
        />
      )}
    </svg>
  );
}

function ScoreMark({ mark, x, thin }: { mark: number; x: number; thin: boolean }) {
  const [ten, five] = [mark % 10 === 0, mark % 5 === 0];
  if (thin && !five) return null;
  return (
    <>
      <path
        d={`M${x} ${EDGE}v${ten ? 20 : five ? 16 : 9}`}
        className={classNames(
          'stroke-ink',
          five ? '[stroke-width:var(--pen-outline)]' : '[stroke-width:var(--pen-inside)]',
        )}
      />
      {(thin ? ten : five) ? (
        <text
          x={x}
          y={FOOT - 7}
          fontSize={18}
          className={classNames('tnum fill-ink [text-anchor:middle]', ten ? 'font-[660]' : 'font-[440]')}
        >
          {mark}
        </text>
      ) : null}
    </>
  );
}

/** A label that would run off the paper turns to the other side. */
function Figure({
  kind,
  x,
  before,
  text,
}: {
  kind: 'bench' | 'own';
  x: number;
  before: boolean;
  text: string;
}) {
  const room = text.length * 8.2 + 20;
  const left = before ? x - room > 0 : x + room > WIDTH;
  return (
    <>
      <CrowsFoot kind={kind} x={x} y={EDGE - 2} size={19} />
      <text
        x={left ? x - 15 : x + 15}
        y={EDGE - 8}
        fontSize={16}
        className={classNames(
          'fill-ink',
          kind === 'bench' && 'font-[620]',
          left ? '[text-anchor:end]' : '[text-anchor:start]',
        )}
      >
        {text}
      </text>
    </>
  );
}
