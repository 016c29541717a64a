const SIGN = 7.2;
const GAP = 6;

export interface PlacedText {
  x: number;
  text: string;
  anchor: 'start' | 'end';
}

/** A stroke's two ends, where it points, and what is to be written beside it on paper of that width. */
interface TextRoom {
  left: number;
  right: number;
  toRight: boolean;
  figure: string;
  name: string;
  width: number;
}

/**
 * The change stands at the stroke's point and the name behind its beginning; what would run off the paper goes to the
 * other side, and a name that fits on neither is cut.
 */
export function placeTexts({ left, right, toRight, figure, name, width }: TextRoom) {
  const room = { left: left - GAP, right: width - right - GAP };
  const wide = figure.length * SIGN;
  const ahead = toRight ? 'right' : 'left';
  const figureSide = room[ahead] >= wide ? ahead : toRight ? 'left' : 'right';
  const free = { ...room, [figureSide]: room[figureSide] - wide - 2 * GAP };
  const behind = figureSide === 'right' ? 'left' : 'right';
  const nameSide =
    free[behind] >= name.length * SIGN || free[behind] >= free[figureSide] ? behind : figureSide;
  const signs = Math.max(1, Math.floor(free[nameSide] / SIGN));
  const text = name.length <= signs ? name : `${name.slice(0, signs - 1).trimEnd()}…`;
  const at = (which: 'left' | 'right', away: number, words: string): PlacedText =>
    which === 'right'
      ? { x: right + GAP + away, text: words, anchor: 'start' }
      : { x: left - GAP - away, text: words, anchor: 'end' };
  return {
    figure: at(figureSide, 0, figure),
    name: at(nameSide, nameSide === figureSide ? wide + 2 * GAP : 0, text),
  };
}
