import 'server-only';
import type { z } from 'zod';
import { lockPractical } from '@/db/queries/practicals';
import { makeVariantsInput } from '@/lib/contracts/variants';
import { draftOf } from '@/lib/practicals/draft-of';
import { nextLetters, variantTitle } from '@/lib/practicals/propose-variants-letters';
import { AXES } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';
import { type Context, defineVerb } from '../verb';
import { loadVariants, originalOf, type PublishedOriginal } from './load-variants';
import { writePractical } from './new-practical';
import { practicalSubject } from './practical-subject';
import { MADE_FROM_ORIGINAL, NOT_PUBLISHED } from './propose-variants';

type Input = z.output<typeof makeVariantsInput>;

export interface MadeVariant {
  practicalId: string;
  title: string;
}

/** The most that are proposed at a time. */
const MOST_AT_ONCE = 6;

/** Makes practicals of other sizes from the latest version, as drafts; letters go on after those that there are. */
export const makeVariants = defineVerb({
  action: 'practical.change',
  input: makeVariantsInput,
  async run(context): Promise<MadeVariant[]> {
    const { actor, input, tx, found, authorize, refuse, log } = context;
    const row = found(await lockPractical(tx, actor.schoolId, input.practicalId));
    authorize(practicalSubject(row));
    if (await originalOf(context, row)) refuse('conflict', MADE_FROM_ORIGINAL);
    const { original: published, variants } = await loadVariants(context, row);
    const original = published ?? refuse('conflict', NOT_PUBLISHED);
    if (original.versionId !== input.versionId) {
      return refuse('stale', 'Another version was published since. Nothing was made: propose again from it.');
    }
    const titles = variants.map(({ title }) => title);
    const letters = input.variants.map(({ letter }) => letter);
    const free = nextLetters(titles, MOST_AT_ONCE);
    if (new Set(letters).size < letters.length || !letters.every((letter) => free.includes(letter))) {
      refuse('stale', 'Other variants were made since. Nothing was made: propose again beside them.');
    }
    const cutLists = readCutLists(context, original);
    const made: MadeVariant[] = [];
    for (const [index, cutList] of cutLists.entries()) {
      const title = variantTitle(original.task.title, letters[index] ?? '');
      const draft = draftOf({ ...original.task, title, cutList }, original.form);
      const source = { versionId: original.versionId, kind: 'variant' as const };
      made.push({ practicalId: await writePractical(context, draft, source), title });
    }
    for (const { practicalId, title } of made) {
      const details = { madeVariant: title, fromPractical: row.id, fromVersion: original.versionId };
      await log({ subjectKind: 'practical', subjectId: practicalId, details });
    }
    return made;
  },
});

/** The original's cut list with each variant's widths and lengths; refused where a line is missing or nothing moved. */
function readCutLists({ input, refuseFields }: Context<Input>, { task }: PublishedOriginal): CutList[] {
  const seen = [sizesIn(task.cutList)];
  return input.variants.map(({ lines }, index) => {
    const sizes = new Map(lines.map((line) => [line.lineId, line]));
    const known = task.cutList.lines.every(({ id }) => sizes.has(id));
    if (!known || lines.length !== task.cutList.lines.length) {
      return refuseFields({ [`variants.${index}`]: ['Its lines are not those of the original.'] });
    }
    const cutList = {
      lines: task.cutList.lines.map((line) => {
        const { width = line.target.width, length = line.target.length } = sizes.get(line.id) ?? {};
        return { ...line, target: { ...line.target, width, length } };
      }),
    };
    if (seen.includes(sizesIn(cutList))) {
      refuseFields({ [`variants.${index}`]: ['It has the sizes of the original or of another of these.'] });
    }
    seen.push(sizesIn(cutList));
    return cutList;
  });
}

function sizesIn({ lines }: CutList): string {
  return lines.map(({ target }) => AXES.map((axis) => target[axis]).join(' ')).join('; ');
}
