import type { Unit } from '@/lib/length';
import { AXES } from '@/lib/scoring';
import { type DraftCheck, type DraftLine, type DraftSizeRule, emptyLine, type PracticalDraft } from './draft';
import { emptyDraft } from './empty-draft';
import { STARTERS, type StarterId, type StarterPlan } from './starter-plans';

/** What a list of starters shows of each. */
export interface StarterView {
  id: StarterId;
  title: string;
  unit: Unit;
  about: string;
  blank: string;
  lines: number;
  pieces: number;
}

export function listStarters(): StarterView[] {
  return Object.entries(STARTERS).map(([, plan]) => ({
    id: plan.id,
    title: plan.title,
    unit: plan.unit,
    about: plan.about,
    blank: `${plan.material} ${plan.blank}`,
    lines: plan.lines.length,
    pieces: plan.lines.reduce((sum, [, , quantity]) => sum + quantity, 0),
  }));
}

/** A starter practical as a draft of one's own, with everything a first version needs. */
export function starterDraft(id: StarterId): PracticalDraft {
  const plan: StarterPlan = STARTERS[id];
  const draft = emptyDraft(plan.unit, plan.title);
  const [thickness, width, length] = sizesOf(plan.blank);
  return {
    ...draft,
    instructions: plan.instructions,
    material: plan.material,
    blank: { thickness, width, length },
    kerf: plan.kerf,
    lines: plan.lines.map(lineOf),
    all: plan.bands ? { ...draft.all, sizes: everyAxis(plan.bands) } : draft.all,
    workChecks: [...draft.workChecks, ...(plan.workChecks ?? []).map(workCheckOf)],
    reading: plan.grossLimit ? { ...draft.reading, grossLimit: plan.grossLimit } : draft.reading,
    prediction: plan.agreeWithin ? { ...draft.prediction, agreeWithin: plan.agreeWithin } : draft.prediction,
    presets: plan.presets ?? draft.presets,
  };
}

function lineOf([id, label, quantity, size, note = '']: StarterPlan['lines'][number]): DraftLine {
  const [thickness, width, length] = sizesOf(size);
  return { ...emptyLine([]), id, label, quantity: String(quantity), thickness, width, length, note };
}

/** `3/4 x 7 x 13` as its three typed sizes. */
function sizesOf(text: string): [thickness: string, width: string, length: string] {
  const [thickness = '', width = '', length = ''] = text.split(' x ');
  return [thickness, width, length];
}

function everyAxis(rule: DraftSizeRule): PracticalDraft['all']['sizes'] {
  const [thickness, width, length] = AXES.map(() => structuredClone(rule));
  return { thickness: thickness ?? rule, width: width ?? rule, length: length ?? rule };
}

function workCheckOf({
  id,
  label,
  pass,
  fail,
  lose,
}: NonNullable<StarterPlan['workChecks']>[number]): DraftCheck {
  return {
    id,
    label,
    levels: [
      { label: pass, lose: '0' },
      { label: fail, lose },
    ],
    assume: 0,
  };
}
