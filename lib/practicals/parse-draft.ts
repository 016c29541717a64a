import { AXES, type Axis, compileRubric, type Rubric, rubricSchema } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';
import type { DraftLine, PracticalDraft } from './draft';
import { type DraftErrors, FieldReader } from './field-reader';
import { parseForm } from './parse-form';
import { type Task, taskSchema } from './task';

export type ParsedDraft =
  | { ok: true; task: Task; form: RubricForm; rubric: Rubric }
  | { ok: false; errors: DraftErrors };

export const MOST_LINES = 200;
const MOST_OF_A_LINE = 200;
const MOST_PIECES = 400;

/**
 * Reads a whole draft: the task, the rubric as authored and as compiled. Otherwise every field that cannot be used,
 * with its messages, by dotted path into the draft (`lines.2.width`, `all.sizes.length.over.bands.1.within`); the
 * path '' holds what belongs to no single field. Pure; the same draft always reads the same.
 */
export function parseDraft(draft: PracticalDraft): ParsedDraft {
  const reader = new FieldReader(draft.unit);
  const task = parseTask(reader, draft);
  const form = parseForm(reader, draft);
  if (Object.keys(reader.errors).length > 0) return { ok: false, errors: reader.errors };
  const checked = { task: taskSchema.safeParse(task), form: rubricFormSchema.safeParse(form) };
  for (const { error } of Object.values(checked)) {
    for (const issue of error?.issues ?? []) reader.refuse('', `${issue.path.join(' ')}: ${issue.message}`);
  }
  if (!checked.task.success || !checked.form.success) return { ok: false, errors: reader.errors };
  const rubric = rubricSchema.parse(compileRubric(checked.form.data, checked.task.data.cutList));
  return { ok: true, task: checked.task.data, form: checked.form.data, rubric };
}

function parseTask(reader: FieldReader, draft: PracticalDraft): Task {
  return {
    title: reader.text('title', draft.title, 120, 'Give the practical a title.'),
    unit: draft.unit,
    instructions: reader.text('instructions', draft.instructions, 4000, null),
    material: reader.text('material', draft.material, 80, null),
    blank: parseBlank(reader, draft.blank),
    kerf: reader.optional(draft.kerf, () => reader.size('kerf', draft.kerf)),
    cutList: { lines: parseLines(reader, draft.lines) },
    lineNotes: Object.fromEntries(
      draft.lines
        .map((line, index) => [line.id, reader.text(`lines.${index}.note`, line.note, 200, null)] as const)
        .filter(([, note]) => note !== ''),
    ),
  };
}

/** All three sizes or none. */
function parseBlank(reader: FieldReader, blank: Record<Axis, string>): Task['blank'] {
  if (AXES.every((axis) => blank[axis].trim() === '')) return null;
  const { thickness, width, length } = blank;
  return {
    thickness: reader.size('blank.thickness', thickness),
    width: reader.size('blank.width', width),
    length: reader.size('blank.length', length),
  };
}

function parseLines(reader: FieldReader, lines: readonly DraftLine[]): Task['cutList']['lines'] {
  if (lines.length === 0) reader.refuse('lines', 'A cut list has at least one line.');
  if (lines.length > MOST_LINES) {
    reader.refuse(
      'lines',
      `A cut list has at most ${MOST_LINES} lines; these are ${lines.length}. All are kept as typed: remove ${lines.length - MOST_LINES} before you publish.`,
    );
  }
  const parsed = lines.map((line, index) => {
    const at = `lines.${index}`;
    return {
      id: line.id,
      label: reader.text(`${at}.label`, line.label, 60, 'Name the part.'),
      quantity: reader.quantity(`${at}.quantity`, line.quantity, MOST_OF_A_LINE),
      target: {
        thickness: reader.size(`${at}.thickness`, line.thickness),
        width: reader.size(`${at}.width`, line.width),
        length: reader.size(`${at}.length`, line.length),
      },
    };
  });
  const pieces = parsed.reduce((sum, { quantity }) => sum + quantity, 0);
  if (pieces > MOST_PIECES) {
    reader.refuse('lines', `A cut list has at most ${MOST_PIECES} pieces in all; these are ${pieces}.`);
  }
  return parsed;
}
