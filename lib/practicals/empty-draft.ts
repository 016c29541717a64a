import type { Unit } from '@/lib/length';
import { defaultRubricForm } from '@/lib/scoring';
import type { PracticalDraft } from './draft';
import { draftOf } from './draft-of';

/** A new practical: no lines yet, every price and policy as a new rubric has it in that unit. */
export function emptyDraft(unit: Unit, title = ''): PracticalDraft {
  const task = {
    title,
    unit,
    instructions: '',
    material: '',
    blank: null,
    kerf: null,
    cutList: { lines: [] },
    lineNotes: {},
  };
  return { ...draftOf(task, defaultRubricForm(unit)), kerf: unit === 'in' ? '1/8' : '3' };
}
