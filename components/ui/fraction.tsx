import type { Length, Unit } from '@/lib/length';
import { classNames } from './class-names';
import { deviationInWords, lengthInWords } from './length-in-words';
import { type LengthParts, type LengthStyle, lengthParts } from './length-parts';

interface FractionProps {
  parts: LengthParts;
  /** Set large by itself, as the bench's target is: no text beside it to hold its own against. */
  display?: boolean;
  className?: string;
}

/** A length set in type: `frac` on the fraction alone; alone or signed, a quarter larger. Says nothing aloud. */
export function Fraction({ parts: { sign, whole, num, den }, display = false, className }: FractionProps) {
  const alone = whole === '';
  return (
    <span aria-hidden="true" className={classNames('whitespace-nowrap', className)}>
      {sign}
      {whole}
      {num === null ? null : (
        <>
          {alone ? null : <span className={display ? 'text-[0.1em]' : 'text-[0.3em]'}> </span>}
          <span className={classNames('frac', alone && !display && 'text-[1.25em] leading-none')}>
            {num}/{den}
          </span>
        </>
      )}
    </span>
  );
}

interface LengthTextProps extends LengthStyle {
  ticks: Length;
  unit: Unit;
  /** Shown and said as a deviation: with its sign, and "over" or "under". */
  signed?: boolean;
  /** Set large by itself. */
  display?: boolean;
  /** Write the unit after it. */
  withUnit?: boolean;
  className?: string;
}

/** A length on screen, and in words for a screen reader: "one and three eighths inches". */
export function LengthText(props: LengthTextProps) {
  const { ticks, unit, denominator, decimals, signed = false, withUnit = false, display, className } = props;
  const style = { denominator, decimals };
  const words = signed ? deviationInWords(ticks, unit, style) : lengthInWords(ticks, unit, style);
  return (
    <span className={classNames('whitespace-nowrap', className)}>
      <Fraction parts={lengthParts(ticks, unit, style, signed)} display={display} />
      {withUnit ? <span aria-hidden="true"> {unit}</span> : null}
      <span className="sr-only select-none">{words}</span>
    </span>
  );
}

interface SizeTextProps extends LengthStyle {
  thickness: Length;
  width: Length;
  length: Length;
  unit: Unit;
  className?: string;
}

/** Thickness × width × length in one line. */
export function SizeText({ thickness, width, length, unit, className, ...style }: SizeTextProps) {
  return (
    <span className={className}>
      <LengthText ticks={thickness} unit={unit} {...style} />
      <span aria-hidden="true"> × </span>
      <span className="sr-only"> by </span>
      <LengthText ticks={width} unit={unit} {...style} />
      <span aria-hidden="true"> × </span>
      <span className="sr-only"> by </span>
      <LengthText ticks={length} unit={unit} {...style} />
    </span>
  );
}
