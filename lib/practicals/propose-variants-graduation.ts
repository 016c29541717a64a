import { type Length, TICKS_PER_INCH, TICKS_PER_MM, type Unit } from '@/lib/length';

export const VARIANT_GRADUATIONS = ['fine', 'coarse'] as const;

export type VariantGraduation = (typeof VARIANT_GRADUATIONS)[number];

/** The handy graduations that variants' sizes move by. */
export const GRADUATION_TICKS: Record<Unit, Record<VariantGraduation, Length>> = {
  in: { fine: TICKS_PER_INCH / 8, coarse: TICKS_PER_INCH / 4 },
  mm: { fine: TICKS_PER_MM, coarse: TICKS_PER_MM * 5 },
};

export const FIRST_GRADUATION: Record<Unit, VariantGraduation> = { in: 'fine', mm: 'coarse' };
