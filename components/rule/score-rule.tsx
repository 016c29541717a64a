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
const BODY = 46;
/** Room for a second row of words where both figures' would stand on one side. */
const LIFT = 22;
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
  const [benchText, ownText] = [textOf(benchLabel, bench), textOf(ownLabel, own)];
  const collide =
    bench !== null &&
    own !== null &&
    isLeft(place(bench / 100), benchFirst, benchText) === isLeft(place(own / 100), !benchFirst, ownText);
  const edge = EDGE + (collide ? LIFT : 0);
  const words = [
    bench === null ? null : `${benchLabel} ${pointsAsText(bench)}`,
    own === null ? null : `${ownLabel} ${pointsAsText(own)}`,
    `of ${pointsAsText(total)}`,
  ];
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${edge + BODY + 2}`}
      role="img"
      aria-label={words.filter(Boolean).join(', ')}
      className={classNames('block h-auto w-full', className)}
    >
      <rect
        x={1}
        y={edge}
        width={WIDTH - 2}
        height={BODY}
        className="fill-plate stroke-ink [stroke-width:var(--pen-outline)]"
      />
      <path d={`M0 ${edge}H${WIDTH}`} className="stroke-ink [stroke-width:var(--pen-edge)]" />
      {marks.map((mark) => (
        <ScoreMark key={mark} mark={mark} x={place(mark)} thin={thin} edge={edge} />
      ))}
      {bench === null ? null : (
        <Figure kind="bench" x={place(bench / 100)} before={benchFirst} text={benchText} edge={edge} />
      )}
      {own === null ? null : (
        <Figure
          kind="own"
          x={place(own / 100)}
          before={!benchFirst && bench !== null}
          text={ownText}
          edge={edge}
          lifted={collide}
        />
      )}
    </svg>
  );
}

function ScoreMark({ mark, x, thin, edge }: { mark: number; x: number; thin: boolean; edge: number }) {
  const [ten, five] = [mark % 10 === 0, mark % 5 === 0];
  if (thin && !five) return null;
  return (
    <>
      <path
        d={`M${x} ${edge}v${ten ? 20 : five ? 16 : 9}`}
        className={classNames(
          'stroke-ink',
          five ? '[stroke-width:var(--pen-outline)]' : '[stroke-width:var(--pen-inside)]',
        )}
      />
      {(thin ? ten : five) ? (
        <text
          x={x}
          y={edge + BODY - 7}
          fontSize={18}
          className={classNames('tnum fill-ink [text-anchor:middle]', ten ? 'font-[660]' : 'font-[440]')}
        >
          {mark}
        </text>
      ) : null}
    </>
  );
}

function textOf(label: string, points: Points | null): string {
  return points === null ? '' : `${label} ${pointsAsText(points)}`;
}

/** Whether a label stands left of its pointer: it turns to the other side where it would run off the paper. */
function isLeft(x: number, before: boolean, text: string): boolean {
  const room = text.length * 8.2 + 20;
  return before ? x - room > 0 : x + room > WIDTH;
}

interface FigureProps {
  kind: 'bench' | 'own';
  x: number;
  before: boolean;
  text: string;
  edge: number;
  /** Written in the row above the other's. */
  lifted?: boolean;
}

function Figure({ kind, x, before, text, edge, lifted = false }: FigureProps) {
  const left = isLeft(x, before, text);
  const aside = lifted ? -9 : 15;
  return (
    <>
      <CrowsFoot kind={kind} x={x} y={edge - 2} size={19} />
      <text
        x={left ? x - aside : x + aside}
        y={edge - 8 - (lifted ? LIFT : 0)}
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
