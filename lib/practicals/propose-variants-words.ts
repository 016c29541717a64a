import type { Length } from '@/lib/length';
import { AXES, type Axis, type Rubric } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';
import { joinWords } from './compare-sizes';
import type { Phrase } from './compare-types';
import { woodChange, woodOfAll } from './propose-variants-fit';
import { type Stop, WOOD_PERCENT } from './propose-variants-types';
import type { Task } from './task';

/** What a variant moves, and what it takes of the wood. */
export function wordsOfProposal(task: Task, cutList: CutList): Phrase[] {
  return [...moveWords(task.cutList, cutList), woodWords(task, cutList)];
}

interface Move {
  from: Length;
  to: Length;
  sizes: { label: string; axis: Axis }[];
}

/** Equal sizes that move together, as one; in the order of the cut list. */
function movesOf(original: CutList, variant: CutList): Move[] {
  const moves = new Map<string, Move>();
  for (const [index, { label, target }] of original.lines.entries()) {
    for (const axis of AXES) {
      const to = variant.lines[index]?.target[axis] ?? target[axis];
      if (to === target[axis]) continue;
      const key = `${target[axis]} ${to}`;
      const move = moves.get(key) ?? { from: target[axis], to, sizes: [] };
      move.sizes.push({ label, axis });
      moves.set(key, move);
    }
  }
  return [...moves.values()];
}

function moveWords(original: CutList, variant: CutList): Phrase[] {
  return movesOf(original, variant).map(({ from, to, sizes }) => {
    const names = AXES.flatMap((axis) => {
      const labels = sizes.filter((size) => size.axis === axis).map(({ label }) => label);
      return labels.length > 0 ? [`${axis} of ${joinWords(labels)}`] : [];
    }).join(', ');
    const name = names.charAt(0).toUpperCase() + names.slice(1);
    return [`${name}: `, { ticks: from }, ' becomes ', { ticks: to }, '.'];
  });
}

function woodWords(task: Task, cutList: CutList): Phrase {
  const kerf = task.kerf ?? 0;
  const tenths = woodChange(woodOfAll(cutList, kerf), woodOfAll(task.cutList, kerf));
  if (tenths === 0) return ['It takes as much wood as the original.'];
  const percent = (Math.abs(tenths) / 10).toString();
  return [`It takes ${percent} percent ${tenths > 0 ? 'more' : 'less'} wood than the original.`];
}

/** What becomes of a borrowed piece where none passes. */
export function lentWords({ grossLimit }: Rubric): Phrase {
  return grossLimit === null
    ? ['Any piece borrowed from another is past the last band twice over somewhere.']
    : [
        'Any piece borrowed from another is past the gross limit of ',
        { ticks: grossLimit },
        ': not that part.',
      ];
}

/** Which line stops the next variant, why, and what gives it room. */
export function wordsOfStop(rubric: Rubric, stop: Stop, step: Length): Phrase {
  const label = rubric.lines[stop.line]?.label ?? '';
  return [`“${label}” stops the next one: `, ...reasonWords(stop, step)];
}

function reasonWords({ why, as }: Stop, step: Length): Phrase {
  switch (why) {
    case 'stays':
      return ['none of its sizes can move by ', { ticks: step }, ' within a quarter of itself.'];
    case 'alike':
      return [`wherever it may move, a piece of it passes for one of ${as?.of}, such as “${as?.label}”.`];
    case 'order':
      return ['moved by ', { ticks: step }, ', its sizes change places with others of the list.'];
    case 'blank':
      return ['the blank has no room to move its sizes by ', { ticks: step }, '.'];
    case 'wood':
      return [
        'moved by ',
        { ticks: step },
        `, its pieces take over ${WOOD_PERCENT} percent more or less wood.`,
      ];
    case 'taken':
      return ['whatever sizes are left, a piece of it passes for one of another variant.'];
  }
}
