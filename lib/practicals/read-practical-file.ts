import { findNodeAtLocation, type Node } from 'jsonc-parser';
import { z } from 'zod';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { MAX_PRACTICAL_FILE_BYTES, PRACTICAL_FILE } from './practical-file';
import { type JsonPath, type PlacedReason, readJson } from './practical-file-json';
import { agreementIssues, keepingIssues } from './practical-file-rules';
import { type FileIssue, fileIssues, practicalFileSchema } from './practical-file-schema';
import { jsonPathText, placeInWords } from './practical-file-words';
import type { Task } from './task';

/** Something in a file that cannot be used: where, in words and as a path, line and column from 1, and why. */
export interface FileProblem {
  place: string;
  path: string;
  line: number;
  column: number;
  reason: string;
}

export type ReadPracticalFile =
  | { ok: true; task: Task; form: RubricForm }
  | { ok: false; problems: FileProblem[] };

/** More than these nobody puts right at a time; each costs a look at its place in the file. */
const MOST_TOLD = 500;

/**
 * Reads the text of a practical file. Either the task and the rubric form exactly as the file has them, or everything
 * that cannot be used, up to 500 things, in the order it stands in the file: no JSON, another format, a later version, unknown, missing
 * and repeated names, figures that no rubric may hold, and words that the editor would not keep as they are. A byte
 * order mark and either kind of line end are taken as they come. Pure; never throws.
 *
 * @example readPracticalFile(writePracticalFile(task, form)) // { ok: true, task, form }
 */
export function readPracticalFile(text: string): ReadPracticalFile {
  const plain = text.startsWith('\uFEFF') ? text.slice(1) : text;
  if (new TextEncoder().encode(plain).length > MAX_PRACTICAL_FILE_BYTES) {
    return refuse(plain, [
      { offset: 0, path: [], reason: 'A practical file has at most 1 MB. This one has more.' },
    ]);
  }
  const json = readJson(plain);
  if (!json.ok) return refuse(plain, json.problems);
  const header = headerIssue(json.value);
  if (header) return refuse(plain, [placed(json.root, header)]);
  const parsed = practicalFileSchema.safeParse(json.value);
  const found = parsed.success
    ? keepingIssues({ task: parsed.data.task, form: parsed.data.form })
    : fileIssues(parsed.error, json.value);
  const agreement = agreementIssues(json.value);
  const told = new Set([...json.problems, ...agreement].map(({ path }) => jsonPathText(path)));
  const issues = [...agreement, ...found.filter(({ path }) => !told.has(jsonPathText(path)))];
  const problems = [
    ...json.problems,
    ...issues.slice(0, MOST_TOLD + 1).map((issue) => placed(json.root, issue)),
  ];
  if (problems.length > 0 || !parsed.success) return refuse(plain, problems, json.value);
  return { ok: true, task: parsed.data.task, form: parsed.data.form };
}

/** Told alone: what a file of another kind says further on means something else. */
function headerIssue(value: unknown): FileIssue | null {
  const refused = (path: JsonPath, reason: string): FileIssue => ({ path, reason, isKey: false });
  const another = 'This is not a practical file: one begins with "trymark": "practical".';
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return refused([], another);
  const { trymark, version } = z
    .looseObject({ trymark: z.unknown().optional(), version: z.unknown().optional() })
    .parse(value);
  if (trymark !== PRACTICAL_FILE.kind) return refused(trymark === undefined ? [] : ['trymark'], another);
  if (version === PRACTICAL_FILE.version) return null;
  const at = version === undefined ? [] : ['version'];
  const isLater = typeof version === 'number' && version > PRACTICAL_FILE.version;
  return refused(
    at,
    isLater
      ? `This file was made by a newer Trymark: it is in version ${version} of the format, and this one reads version ${PRACTICAL_FILE.version}.`
      : `The version of the format is ${PRACTICAL_FILE.version}.`,
  );
}

const AND_MORE = 'Here and further on more is wrong. Put right what stands above it first.';

/** At the value, else at the name, else at the nearest group that is there. */
function placed(root: Node, { path, reason, isKey }: FileIssue): PlacedReason {
  for (let length = path.length; length > 0; length--) {
    const node = findNodeAtLocation(root, path.slice(0, length));
    if (!node) continue;
    const name = node.parent?.type === 'property' ? node.parent : node;
    return { offset: (isKey && length === path.length ? name : node).offset, path, reason };
  }
  return { offset: root.offset, path, reason };
}

function refuse(text: string, problems: PlacedReason[], value?: unknown): ReadPracticalFile {
  const starts = lineStarts(text);
  const labelOf = labelsIn(value);
  let line = 0;
  const told = problems
    .toSorted((a, b) => a.offset - b.offset)
    .slice(0, MOST_TOLD + 1)
    .map(({ offset, path, reason }, index): FileProblem => {
      while ((starts[line + 1] ?? Number.POSITIVE_INFINITY) <= offset) line += 1;
      return {
        place: placeInWords(path, labelOf),
        path: jsonPathText(path),
        line: line + 1,
        column: offset - (starts[line] ?? 0) + 1,
        reason: index < MOST_TOLD ? reason : AND_MORE,
      };
    });
  return { ok: false, problems: told };
}

function lineStarts(text: string): number[] {
  return [0, ...[...text.matchAll(/\r\n|\n|\r/g)].map((end) => end.index + end[0].length)];
}

const labelled = z.looseObject({
  task: z.looseObject({
    cutList: z.looseObject({ lines: z.array(z.looseObject({ id: z.string(), label: z.string() })) }),
  }),
});

/** The names of the lines, where the file has them in order. */
function labelsIn(value: unknown): (lineId: string) => string | null {
  const read = labelled.safeParse(value);
  const lines = read.success ? read.data.task.cutList.lines : [];
  return (lineId) => lines.find(({ id }) => id === lineId)?.label ?? null;
}
