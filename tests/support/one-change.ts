/** A value with one thing in it made another, and the dotted path of that thing: a figure, a word, a list. */
export interface Change {
  path: string;
  isLeaf: boolean;
  value: unknown;
}

const WORDS = ['in', 'mm', 'each', 'worst', 'worth', 'start', 'higher', 'latest', 'another'];

/** Every leaf made another, every list shortened, lengthened and turned round, every key left out; in turn. */
export function* changesOf(value: unknown, path = ''): Generator<Change> {
  const isLeaf = Array.isArray(value) || typeof value !== 'object' || value === null;
  for (const other of othersOf(value)) yield { path, isLeaf, value: other };
  if (Array.isArray(value)) {
    for (const [index, each] of value.entries()) {
      for (const change of changesOf(each, join(path, String(index)))) {
        yield { ...change, value: value.with(index, change.value) };
      }
    }
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, each] of Object.entries(value)) {
      const { [key]: _, ...rest } = value as Record<string, unknown>;
      yield { path, isLeaf, value: rest };
      for (const change of changesOf(each, join(path, key))) {
        yield { ...change, value: { ...value, [key]: change.value } };
      }
    }
  }
}

function join(path: string, key: string): string {
  return path === '' ? key : `${path}.${key}`;
}

function othersOf(value: unknown): unknown[] {
  if (typeof value === 'number')
    return [value + 1, value - 1, value + 100, value - 100, value * 2, 0, 10, null];
  if (typeof value === 'boolean') return [!value];
  if (typeof value === 'string')
    return [`${value} too`, `${value}-2`, ...WORDS.filter((word) => word !== value)];
  if (value === null) return [0, 1, 100, { perDay: 1, max: 2 }, { thickness: 1, width: 1, length: 1 }];
  if (Array.isArray(value))
    return [value.slice(1), value.slice(0, -1), value.toReversed(), [...value, ...again(value)]];
  return [null, { kind: 'average', roundTo: 10 }, { kind: 'latest', capPercent: 70 }];
}

/** The last of a list once more, under another id where it has one. */
function again(list: readonly unknown[]): unknown[] {
  const last: unknown = list.at(-1);
  if (typeof last !== 'object' || last === null) return [last];
  return [{ ...last, ...('id' in last ? { id: 'one-more' } : {}) }];
}
