import { classNames } from '@/components/ui/class-names';
import type { LengthParts } from '@/components/ui/length-parts';

interface RuleNumberProps {
  parts: LengthParts;
  x: number;
  baseline: number;
  size: number;
  /** Numerator over denominator, for a number that is read from a metre away. */
  stacked?: boolean;
  /** Clears the ground round the figures where lines run through. */
  halo?: boolean;
  className?: string;
}

const CAP = 0.69;
const DIGIT = 0.477;

/** A length lettered on a rule, in the narrow cut of the face. */
export function RuleNumber({ stacked = false, ...props }: RuleNumberProps) {
  const { parts, x, baseline, size, halo, className } = props;
  if (stacked && parts.num !== null) return <StackedNumber {...props} />;
  const place = { x, y: baseline, fontSize: size };
  const face = 'tnum font-[600] font-stretch-[76%] [text-anchor:middle]';
  return (
    <>
      {halo ? (
        <text {...place} className={`${face} stroke-plate`} strokeWidth={size * 0.45} strokeLinejoin="round">
          <Figures parts={parts} size={size} />
        </text>
      ) : null}
      <text {...place} className={classNames(face, className)}>
        <Figures parts={parts} size={size} />
      </text>
    </>
  );
}

function Figures({ parts, size }: { parts: LengthParts; size: number }) {
  const alone = parts.whole === '';
  return (
    <>
      {parts.sign}
      {parts.whole}
      {parts.num === null ? null : (
        <tspan
          className="frac"
          dx={alone ? undefined : size * 0.1}
          fontSize={alone ? size * 1.25 : undefined}
        >
          {parts.num}/{parts.den}
        </tspan>
      )}
    </>
  );
}

function StackedNumber({ parts: { whole, num, den }, x, baseline, size, className }: RuleNumberProps) {
  const small = size * (whole === '' ? 0.78 : 0.7);
  const digits = Math.max(String(num).length, String(den).length);
  const fractionWidth = digits * DIGIT * small;
  const wholeWidth = whole.length * DIGIT * size;
  const gap = whole === '' ? 0 : size * 0.1;
  const start = x - (wholeWidth + gap + fractionWidth) / 2;
  const middle = baseline - (CAP * size) / 2;
  const fractionX = start + wholeWidth + gap + fractionWidth / 2;
  const clear = size * 0.1;
  return (
    <g className={classNames('tnum font-[600] font-stretch-[76%] [text-anchor:middle]', className)}>
      {whole === '' ? null : (
        <text x={start} y={baseline} fontSize={size} className="[text-anchor:start]">
          {whole}
        </text>
      )}
      <text x={fractionX} y={middle - clear} fontSize={small}>
        {num}
      </text>
      <path
        d={`M${fractionX - fractionWidth / 2} ${middle}h${fractionWidth}`}
        className="stroke-current"
        strokeWidth={size * 0.055}
      />
      <text x={fractionX} y={middle + clear + CAP * small} fontSize={small}>
        {den}
      </text>
    </g>
  );
}
