/** Numbers that look random and are the same every time, so that the demo is the same everywhere. */
export interface Random {
  /** From 0 up to, not including, 1. */
  next(): number;
  whole(from: number, to: number): number;
  pick<T>(items: readonly T[]): T;
  chance(probability: number): boolean;
  /** Normal deviate with mean 0 and standard deviation 1. */
  normal(): number;
  uuid(): string;
}

export function makeRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  const whole = (from: number, to: number) => from + Math.floor(next() * (to - from + 1));
  return {
    next,
    whole,
    pick: (items) => {
      const item = items[whole(0, items.length - 1)];
      if (item === undefined) throw new Error('nothing to pick from');
      return item;
    },
    chance: (probability) => next() < probability,
    normal: () => Math.sqrt(-2 * Math.log(1 - next())) * Math.cos(2 * Math.PI * next()),
    uuid: () => {
      const hex = Array.from({ length: 32 }, () => whole(0, 15).toString(16));
      hex[12] = '4';
      hex[16] = (8 + whole(0, 3)).toString(16);
      const text = hex.join('');
      return [
        text.slice(0, 8),
        text.slice(8, 12),
        text.slice(12, 16),
        text.slice(16, 20),
        text.slice(20),
      ].join('-');
    },
  };
}
