/** A whole count of ticks; 1 tick = 0.1 nm. */
export type Length = number;

export type Unit = 'in' | 'mm';

/** 25.4 mm exactly: the international inch of 1959. */
export const TICKS_PER_INCH = 254_000_000;
export const TICKS_PER_MM = 10_000_000;

/** The longest length the product accepts: 10 m. */
export const MAX_LENGTH: Length = 10_000 * TICKS_PER_MM;
