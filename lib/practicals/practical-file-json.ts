import { createScanner, type Node, type ParseError, parseTree, printParseErrorCode } from 'jsonc-parser';

export type JsonPath = readonly (string | number)[];

/** Something wrong at a place of a text, counted in characters from its beginning. */
export interface PlacedReason {
  offset: number;
  path: JsonPath;
  reason: string;
}

export type ReadJson =
  | { ok: true; root: Node; value: unknown; problems: PlacedReason[] }
  | { ok: false; problems: PlacedReason[] };

const DEEPEST = 32;
const LONGEST = 1000;
const MOST_SYNTAX = 10;
/** The scanner's tokens for { and [, and for } and ]. */
const OPENING = [1, 3];
const CLOSING = [2, 4];

const SYNTAX: Partial<Record<ReturnType<typeof printParseErrorCode>, string>> = {
  InvalidSymbol: 'This word has no meaning here. A text stands in double quotes.',
  InvalidNumberFormat: 'This is not how a number is written here. Write a whole number, such as 900.',
  PropertyNameExpected: 'A name in double quotes belongs here, or the comma before it is one too many.',
  ValueExpected: 'A value is missing here, or the comma before it is one too many.',
  ColonExpected: 'A colon is missing between the name and its value.',
  CommaExpected: 'A comma is missing before this.',
  CloseBraceExpected: 'A closing brace } is missing.',
  CloseBracketExpected: 'A closing bracket ] is missing.',
  EndOfFileExpected: 'The file goes on after its end. It is one group in braces and nothing after it.',
  InvalidCommentToken: 'A remark has no place in this file. Take it out.',
  UnexpectedEndOfComment: 'A remark has no place in this file. Take it out.',
  UnexpectedEndOfString: 'The closing double quote of this text is missing.',
  InvalidUnicode: 'A letter written as \\u has four digits after it.',
  InvalidEscapeCharacter:
    'After a backslash only certain letters may stand in a text. Two backslashes make one.',
  InvalidCharacter: 'A text cannot hold this sign as it is: a tab is \\t, a new line \\n.',
};

/**
 * Reads strict JSON and keeps the place of every part. Told apart from JSON that is merely broken, each at its place:
 * remarks, a name used twice in one group, the name `__proto__`, a number with a point or an exponent, one past 2^53,
 * groups more than 32 deep and lists of more than 1000. Expects a text without a byte order mark. Pure; never throws.
 */
export function readJson(text: string): ReadJson {
  if (text.trim() === '') return refused(0, 'There is nothing in it.');
  const deep = findTooDeep(text);
  if (deep !== null) return refused(deep, `This is nested more than ${DEEPEST} deep. No practical is.`);
  const errors: ParseError[] = [];
  const root = parseTree(text, errors, { disallowComments: true, allowTrailingComma: false });
  if (errors.length > 0 || !root) return { ok: false, problems: syntaxProblems(errors) };
  const long = findTooLong(root);
  if (long)
    return refused(long.offset, `This list has more than ${LONGEST} entries. No practical has so many.`);
  try {
    return { ok: true, root, value: JSON.parse(text), problems: [...walk(text, root, [])] };
  } catch {
    return refused(0, 'This is not JSON.');
  }
}

function refused(offset: number, reason: string): ReadJson {
  return { ok: false, problems: [{ offset, path: [], reason }] };
}

/** Without recursion, so that a file of a million brackets is answered like any other. */
function findTooDeep(text: string): number | null {
  const scanner = createScanner(text, true);
  let depth = 0;
  let before = -1;
  while (scanner.getPosition() > before) {
    before = scanner.getPosition();
    const token: number = scanner.scan();
    if (OPENING.includes(token)) depth += 1;
    if (CLOSING.includes(token)) depth -= 1;
    if (depth > DEEPEST) return scanner.getTokenOffset();
  }
  return null;
}

function findTooLong(node: Node): Node | undefined {
  const { type, children = [] } = node;
  if (type === 'array' && children.length > LONGEST) return node;
  for (const child of children) {
    const long = findTooLong(child);
    if (long) return long;
  }
  return undefined;
}

/** One reason a place: what follows from the first mistake of a place says nothing more. */
function syntaxProblems(errors: readonly ParseError[]): PlacedReason[] {
  const byOffset = new Map<number, PlacedReason>();
  for (const { offset, error } of errors) {
    const reason = SYNTAX[printParseErrorCode(error)] ?? 'This is not JSON.';
    if (!byOffset.has(offset)) byOffset.set(offset, { offset, path: [], reason });
  }
  const problems = [...byOffset.values()].slice(0, MOST_SYNTAX);
  return problems.length > 0 ? problems : [{ offset: 0, path: [], reason: 'This is not JSON.' }];
}

function* walk(text: string, node: Node, path: JsonPath): Generator<PlacedReason> {
  if (node.type === 'number') yield* numberProblem(text, node, path);
  if (node.type === 'array') {
    for (const [index, child] of (node.children ?? []).entries()) yield* walk(text, child, [...path, index]);
  }
  if (node.type !== 'object') return;
  const names = new Set<string>();
  for (const { children = [] } of node.children ?? []) {
    const [name, value] = children;
    if (!name || !value) continue;
    const key = String(name.value);
    const at = { offset: name.offset, path: [...path, key] };
    if (key === '__proto__') yield { ...at, reason: 'A practical file knows no such name.' };
    else if (names.has(key)) yield { ...at, reason: `“${key}” stands here twice. Keep one of them.` };
    names.add(key);
    yield* walk(text, value, [...path, key]);
  }
}

function* numberProblem(text: string, { offset, length }: Node, path: JsonPath): Generator<PlacedReason> {
  const written = text.slice(offset, offset + length);
  if (!/^-?\d+$/.test(written)) {
    yield {
      offset,
      path,
      reason: 'Every number here is whole: write it out, without a point or an exponent.',
    };
  } else if (!Number.isSafeInteger(Number(written))) {
    yield { offset, path, reason: 'This number is past 2^53, too large to be kept exactly.' };
  }
}
