type Bag = Record<string, unknown>;

const isBag = (value: unknown): value is Bag => typeof value === 'object' && value !== null;

function holderOf(root: object, path: string): { holder: Bag; key: string } | null {
  const keys = path.split('.');
  const last = keys.pop();
  let holder: unknown = root;
  for (const key of keys) {
    if (!isBag(holder) || !Object.hasOwn(holder, key)) return null;
    holder = holder[key];
  }
  return last !== undefined && isBag(holder) && Object.hasOwn(holder, last) ? { holder, key: last } : null;
}

/** The text typed at a dotted path (`lines.1.width`); empty for a path that the draft, or the part of it, does not have. */
export function textAt(root: object, path: string): string {
  const found = holderOf(root, path);
  const value = found?.holder[found.key];
  return typeof value === 'string' ? value : '';
}

/** Types a text at a path, in place; a path that holds no text, or does not exist, is left alone. */
export function typeAt(root: object, path: string, text: string): void {
  const found = holderOf(root, path);
  if (found && typeof found.holder[found.key] === 'string') found.holder[found.key] = text;
}
