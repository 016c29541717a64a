import type { Page } from 'playwright/test';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { STARTER_IDS, STARTERS, type StarterPlan } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import { type Task, taskSchema } from '@/lib/practicals/task';
import { type Rubric, rubricSchema } from '@/lib/scoring';
import { ownerSql } from '@/tests/support/database';
import { makePerson, makeSchool, type TestSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { Author } from './fixtures/author';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';
const AXES = ['thickness', 'width', 'length'] as const;

/** Writing a practical key by key takes its time. */
test.describe.configure({ timeout: 240_000 });

interface Published {
  task: Task;
  rubric: Rubric;
}

/** Ids are the editor's own: lines and checks by their place instead, which is what a student and a score see. */
function byPlace({ task, rubric }: Published): Published {
  const places = new Map(task.cutList.lines.map(({ id }, index) => [id, `line ${index + 1}`]));
  const placed = <T extends { id: string }>(items: T[]) =>
    items.map((item, index) => ({ ...item, id: places.get(item.id) ?? `${index + 1}` }));
  return {
    task: {
      ...task,
      cutList: { lines: placed(task.cutList.lines) },
      lineNotes: Object.fromEntries(
        Object.entries(task.lineNotes).map(([id, note]) => [places.get(id) ?? id, note]),
      ),
    },
    rubric: {
      ...rubric,
      lines: placed(rubric.lines).map((line) => ({ ...line, checks: placed(line.checks) })),
      workChecks: placed(rubric.workChecks),
    },
  };
}

function starterAsPublished(plan: StarterPlan): Published {
  const read = parseDraft(starterDraft(plan.id));
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return byPlace(read);
}

async function publishedIn({ id }: TestSchool): Promise<Published> {
  const [row] = await ownerSql()`select task, rubric from rubric_versions where school_id = ${id}`;
  return byPlace({ task: taskSchema.parse(row?.task), rubric: rubricSchema.parse(row?.rubric) });
}

async function writeTask(author: Author, plan: StarterPlan): Promise<void> {
  const { page } = author;
  await author.walkAndPress(author.link('new practical'));
  await author.walkAndType(page.getByLabel('title'), plan.title);
  const unit = plan.unit === 'in' ? 'inches' : 'millimetres';
  await author.walkAndChoose(page.getByRole('group', { name: 'unit' }), unit);
  await author.walkAndPress(author.button('make the practical'));
  await expect(page.getByRole('heading', { name: plan.title })).toBeVisible();
  await author.walkAndType(page.getByLabel('instructions'), plan.instructions);
  await author.walkAndType(page.getByLabel('wood'), plan.material);
  for (const [index, size] of plan.blank.split(' x ').entries()) {
    await author.walkAndType(page.getByLabel(AXES[index] ?? '', { exact: true }), size);
  }
  await author.walkAndType(page.getByLabel('kerf'), plan.kerf);
}

/** Row by row: Tab to the right, Enter to the next row. */
async function writeCutList(author: Author, plan: StarterPlan): Promise<void> {
  await author.walkAndPress(author.link(/cut list and prices/));
  await author.walkAndPress(author.button('add a line'));
  for (const [index, [, label, quantity, size, note]] of plan.lines.entries()) {
    if (index > 0) await author.page.keyboard.press('Enter');
    await author.typeRow([label, String(quantity), ...size.split(' x '), ...(note ? [note] : [])]);
  }
}

/** Bands as typed on the one side that both are alike in, then doubled by the preset's key. */
async function writePrices(author: Author, plan: StarterPlan): Promise<void> {
  if (!plan.bands) return;
  const field = (name: string) => author.page.getByLabel(name, { exact: true });
  const [cheap, dear] = ['under', 'over'] as const;
  for (const [index, { within, lose }] of plan.bands[cheap].bands.entries()) {
    await author.walkAndType(field(`${dear}, length, band ${index + 1}, within`), within);
    if (index > 0) await author.walkAndType(field(`${dear}, length, band ${index + 1}, points`), lose);
  }
  await author.walkAndType(field(`${dear}, length, past the last band, points`), plan.bands[cheap].beyond);
  if (plan.presets?.includes('oversize-doubles')) {
    await author.walkAndPress(author.button('oversize doubles'));
  }
}

async function writeRules(author: Author, plan: StarterPlan): Promise<void> {
  const { page } = author;
  const { grossLimit, agreeWithin, workChecks = [] } = plan;
  if (!grossLimit && !agreeWithin && workChecks.length === 0) return;
  await author.walkAndPress(author.link(/total and rules/));
  if (grossLimit) await author.walkAndType(page.getByLabel('gross limit'), grossLimit);
  if (agreeWithin) await author.walkAndType(page.getByLabel('a size agrees within'), agreeWithin);
  for (const { label, pass, fail, lose } of workChecks) {
    await author.walkAndPress(author.button('add a check'));
    for (const [name, text] of [
      ['what is checked', label],
      ['passes as', pass],
      ['or is', fail],
      ['loses', lose],
    ] as const) {
      await author.walkAndType(page.getByLabel(name, { exact: true }).last(), text);
    }
  }
}

async function publish(author: Author): Promise<void> {
  await author.expectKept();
  await author.walkAndPress(author.button(/^publish version 1/));
  const { page } = author;
  const dialog = page.getByRole('dialog');
  await author.walkAndPress(dialog.getByRole('button', { name: 'publish version 1' }));
  await expect(page.getByRole('dialog', { name: 'Version 1 is published' })).toBeVisible();
}

/** No pointer of any kind reaches the page: whatever is done here was done with keys. */
async function refusePointers(page: Page): Promise<void> {
  await page.addInitScript(() => {
    for (const kind of ['pointerdown', 'mousedown', 'touchstart', 'paste']) {
      window.addEventListener(kind, () => console.error(`this journey has no ${kind}`), true);
    }
  });
}

for (const id of STARTER_IDS) {
  const plan = STARTERS[id];
  test(`a teacher writes the ${plan.title} from an empty practical with keys alone, and publishes what the starter is`, async ({
    page,
  }) => {
    const school = await makeSchool();
    const teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
    await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
    await refusePointers(page);
    await page.goto('/practicals');
    const author = new Author(page);
    await writeTask(author, plan);
    await writeCutList(author, plan);
    await writePrices(author, plan);
    await writeRules(author, plan);
    await publish(author);
    await page.keyboard.press('Escape');
    await expectAccessible(page);
    expect(await publishedIn(school)).toEqual(starterAsPublished(plan));
  });
}
