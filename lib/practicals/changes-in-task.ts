import { AXES } from '@/lib/scoring';
import type { CutListLine } from '@/lib/scoring/rubric-form';
import { nowWas, quoted } from './change-words';
import type { Phrase } from './compare-types';
import type { Task } from './task';

const MOST_NAMED = 12;
const LONGEST_QUOTE = 160;

/** What another version asks for otherwise, apart from prices. */
export function changesInTask(before: Task, now: Task): Phrase[] {
  const text = (label: string, was: string, is: string): Phrase[] =>
    was === is ? [] : [nowWas(label, quoted(is), quoted(was))];
  return [
    ...text('title', before.title, now.title),
    ...(before.unit === now.unit ? [] : [nowWas('unit', unitName(now), unitName(before))]),
    ...instructionChanges(before.instructions, now.instructions),
    ...text('wood', before.material, now.material),
    ...blankChanges(before.blank, now.blank),
    ...(before.kerf === now.kerf ? [] : [nowWas('kerf', optional(now.kerf), optional(before.kerf))]),
    ...lineChanges(before, now),
  ];
}

function unitName({ unit }: Task): string {
  return unit === 'in' ? 'inches' : 'millimetres';
}

function optional(ticks: number | null): Phrase {
  return ticks === null ? ['none'] : [{ ticks }];
}

/** Paragraph by paragraph; what is only moved or spaced otherwise is told as such. */
function instructionChanges(before: string, now: string): Phrase[] {
  if (before === now) return [];
  const [was, is] = [paragraphs(before), paragraphs(now)];
  const out = was.filter((paragraph) => !is.includes(paragraph));
  const put = is.filter((paragraph) => !was.includes(paragraph));
  if (out.length + put.length === 0) return [['Instructions: the same sentences, set otherwise.']];
  return [
    ...out.map((paragraph): Phrase => [`Instructions: taken out ${quoted(shorten(paragraph))}.`]),
    ...put.map((paragraph): Phrase => [`Instructions: added ${quoted(shorten(paragraph))}.`]),
  ];
}

function paragraphs(text: string): string[] {
  return text
    .split(/\n+/)
    .map((line) => line.trim())
    .filter((line) => line !== '');
}

function shorten(text: string): string {
  return text.length <= LONGEST_QUOTE ? text : `${text.slice(0, LONGEST_QUOTE - 1).trimEnd()}…`;
}

function blankChanges(before: Task['blank'], now: Task['blank']): Phrase[] {
  const same = AXES.every((axis) => before?.[axis] === now?.[axis]);
  const words = (blank: Task['blank']): Phrase => (blank ? sizeWords(blank) : ['none']);
  return same ? [] : [nowWas('blank', words(now), words(before))];
}

function sizeWords({ thickness, width, length }: CutListLine['target']): Phrase {
  return [{ ticks: thickness }, ' × ', { ticks: width }, ' × ', { ticks: length }];
}

/** A line's label, with its number where another line has the same one. */
export function lineName(line: { id: string; label: string }, lines: Task['cutList']['lines']): string {
  const alike = lines.filter(({ label }) => label === line.label).length > 1;
  return alike ? `${line.label} (line ${lines.findIndex(({ id }) => id === line.id) + 1})` : line.label;
}

function lineChanges(before: Task, now: Task): Phrase[] {
  const [was, is] = [before.cutList.lines, now.cutList.lines];
  const kept = is.flatMap((line) => {
    const old = was.find(({ id }) => id === line.id);
    return old ? [{ old, line }] : [];
  });
  const has = (lines: typeof is, { id }: CutListLine) => lines.some((line) => line.id === id);
  return [
    ...was.filter((line) => !has(is, line)).map((line) => wholeLine('Line taken out: ', line)),
    ...is.filter((line) => !has(was, line)).map((line) => wholeLine('Line added: ', line)),
    ...kept.flatMap(({ old, line }) => changesOfLine(old, line, lineName(line, is))),
    ...noteChanges(before, now),
    ...orderChange(was, is),
  ];
}

function wholeLine(opening: string, { label, quantity, target }: CutListLine): Phrase {
  const pieces = quantity === 1 ? '1 piece' : `${quantity} pieces`;
  return [`${opening}${label}, ${pieces} of `, ...sizeWords(target), '.'];
}

function changesOfLine(old: CutListLine, line: CutListLine, name: string): Phrase[] {
  return [
    ...(old.label === line.label ? [] : [nowWas('name of a line', quoted(line.label), quoted(old.label))]),
    ...(old.quantity === line.quantity
      ? []
      : [nowWas(`pieces of ${name}`, String(line.quantity), String(old.quantity))]),
    ...AXES.filter((axis) => old.target[axis] !== line.target[axis]).map((axis) =>
      nowWas(`${axis} of ${name}`, [{ ticks: line.target[axis] }], [{ ticks: old.target[axis] }]),
    ),
  ];
}

function noteChanges(before: Task, now: Task): Phrase[] {
  const noteOf = ({ lineNotes }: Task, id: string) =>
    Object.hasOwn(lineNotes, id) ? (lineNotes[id] ?? '') : '';
  return now.cutList.lines
    .filter(({ id }) => noteOf(before, id) !== noteOf(now, id))
    .map((line) =>
      nowWas(
        `note of ${lineName(line, now.cutList.lines)}`,
        quoted(noteOf(now, line.id)),
        quoted(noteOf(before, line.id)),
      ),
    );
}

function orderChange(was: readonly CutListLine[], is: readonly CutListLine[]): Phrase[] {
  const ids = (lines: readonly CutListLine[], others: readonly CutListLine[]) =>
    lines.map(({ id }) => id).filter((id) => others.some((other) => other.id === id));
  if (ids(was, is).join() === ids(is, was).join()) return [];
  const labels = is.map(({ label }) => label);
  const named = labels.slice(0, MOST_NAMED).join(', ');
  return [[`Order of the lines: now ${named}${labels.length > MOST_NAMED ? ' …' : ''}.`]];
}
