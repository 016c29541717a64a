import type { Length } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import type { ComparedRow, ComparedValue, Phrase } from './compare-types';

export function lengthValue(ticks: Length | null): ComparedValue {
  return ticks === null ? { kind: 'none' } : { kind: 'length', ticks };
}

export function pointsValue(points: Points | null): ComparedValue {
  return points === null ? { kind: 'none' } : { kind: 'points', points };
}

export function percentValue(percent: number | null): ComparedValue {
  return percent === null ? { kind: 'none' } : { kind: 'percent', percent };
}

export function textValue(text: string | null): ComparedValue {
  return text === null ? { kind: 'none' } : { kind: 'text', text };
}

export function comparedRow(label: Phrase | string, values: ComparedValue[]): ComparedRow {
  const differs = new Set(values.map((value) => JSON.stringify(value))).size > 1;
  return { label: typeof label === 'string' ? [label] : label, values, differs };
}
