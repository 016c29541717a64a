import type { Page } from 'playwright/test';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { ownerSql } from '@/tests/support/database';
import { makePractical } from '@/tests/support/factories';
import {
  makePerson,
  makeSchool,
  makeSection,
  type TestPerson,
  type TestSchool,
} from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { starter } from '@/tests/support/variant-examples';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

let school: TestSchool;
let teacher: TestPerson;

test.beforeEach(async ({ page }) => {
  school = await makeSchool();
  teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
});

const publishStarter = (id: StarterId) => makePractical(school, teacher.personId, starter(id));

/** The original's next version, in which a missing piece costs 7 points. */
async function publishDearer(practicalId: string): Promise<void> {
  const sql = ownerSql();
  const { task, form, rubric } = starter('desk-caddy');
  const priced = { ...form, defaults: { ...form.defaults, missing: 700 } };
  const lines = rubric.lines.map((line) => ({ ...line, missing: 700 }));
  const json = (value: object) => sql.json(JSON.parse(JSON.stringify(value)));
  await sql`
    insert into rubric_versions
      (school_id, practical_id, number, task, form, rubric, engine_version, published_by)
    values (${school.id}, ${practicalId}, 2, ${json(task)}, ${json(priced)}, ${json({ ...rubric, lines })}, 1,
      ${teacher.personId})`;
}

async function period(name: string): Promise<void> {
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
  await ownerSql()`update sections set period = ${name} where id = ${sectionId}`;
}

const size = (page: Page, name: string) => page.getByRole('textbox', { name, exact: true });

const row = (page: Page, name: string) =>
  page
    .getByRole('table', { name: 'the original and its variants' })
    .getByRole('row', { name: new RegExp(`^${name} `) });

test('a teacher makes variants by the rule, changes a size by hand, gives each period another, and takes new prices over', async ({
  page,
}) => {
  const { practicalId } = await publishStarter('desk-caddy');
  await period('1');
  await period('2');

  await page.goto(`/practicals/${practicalId}`);
  await page.getByRole('link', { name: 'variants with other sizes' }).click();
  await expect(page.getByRole('heading', { name: 'Variants of Desk caddy' })).toBeVisible();
  await expect(page.getByText('within 8 percent')).toBeVisible();
  await expectAccessible(page);

  await page.getByText('3', { exact: true }).click();
  await page.getByRole('button', { name: 'propose sizes' }).click();
  await expect(page.getByRole('heading', { name: 'variant D' })).toBeVisible();
  await expect(size(page, 'variant B, base, width')).toHaveValue('3 1/8');
  await expect(page.getByText('not that part').first()).toBeVisible();
  await expectAccessible(page);

  // A size that cannot be read is told at its field, and nothing can be made meanwhile.
  await size(page, 'variant B, end, length').fill('4 1/');
  await expect(page.getByText('A fraction needs a number above and one below the line.')).toBeVisible();
  await expect(page.getByRole('button', { name: /^make variants B, C and D ?, not yet/ })).toBeVisible();

  // Back at the original's sizes, a borrowed end and side fit: it is told at once, on each of both sides.
  await size(page, 'variant B, end, length').fill('4');
  await size(page, 'variant B, end, width').fill('3 1/2');
  await expect(page.getByText('“end” of the original can be lent for “end”')).toBeVisible();
  await expect(page.getByText('the same size: it fits')).toBeVisible();
  await expect(page.getByText('Changed by hand.')).toBeVisible();
  await expectAccessible(page);
  await size(page, 'variant B, end, width').fill('3 1/8');
  await expect(page.getByText('can be lent')).toHaveCount(0);

  await page.getByRole('checkbox', { name: 'make variant C' }).uncheck();
  await page.getByRole('button', { name: 'make variants B and D' }).click();
  await expect(row(page, 'variant B')).toContainText('draft');
  await expect(row(page, 'variant D')).toContainText('as the original');
  await expect(page.getByText('variant C')).toHaveCount(0);
  await expectAccessible(page);

  await row(page, 'variant B').getByRole('link', { name: 'variant B' }).click();
  await expect(page.getByRole('heading', { name: 'Desk caddy, variant B' })).toBeVisible();
  await page.getByRole('button', { name: 'publish version 1' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'publish version 1' }).click();
  await page.getByRole('dialog').getByRole('link', { name: 'open a sitting' }).click();

  await page.getByLabel('period').selectOption({ label: 'period 1, Woods 2, 0 students' });
  await expect(page.getByRole('radio', { name: 'variant B' })).toBeChecked();
  await page.getByText('original', { exact: true }).first().click();
  await expect(page.getByLabel('practical')).toContainText('Desk caddy');
  await page.getByRole('button', { name: 'open the sitting' }).click();
  await expect(page.getByRole('heading', { name: 'Desk caddy' })).toBeVisible();

  await page.goto(`/sittings/new?practical=${practicalId}`);
  await page.getByLabel('period').selectOption({ label: 'period 2, Woods 2, 0 students' });
  const have = page.getByRole('list', { name: 'who has which sizes' });
  await expect(have.getByRole('listitem')).toHaveText([/^original.*period 1$/, /^variant B.*none of your/]);
  await page.getByText('variant B', { exact: true }).first().click();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'open the sitting' }).click();
  await expect(page.getByRole('heading', { name: 'Desk caddy, variant B' })).toBeVisible();

  await publishDearer(practicalId);
  await page.goto(`/practicals/${practicalId}/variants`);
  await expect(row(page, 'original')).toContainText('period 1');
  await expect(row(page, 'variant B')).toContainText('period 2');
  await page.getByRole('button', { name: 'variant B: prices differ' }).click();
  const dialog = page.getByRole('dialog', { name: 'Prices of variant B' });
  await expect(dialog).toContainText('missing');
  await expectAccessible(page);
  await dialog.getByRole('button', { name: 'take the prices over' }).click();
  await expect(row(page, 'variant B')).toContainText('as the original');
  await expect(row(page, 'variant B')).toContainText('draft changed');
  await row(page, 'variant B').getByRole('link', { name: 'variant B' }).click();
  await expect(page.getByLabel('points for a missing piece, all lines')).toHaveValue('7');
});

test('where the rule finds no sizes, the line that stops it is named', async ({ page }) => {
  const { practicalId } = await publishStarter('stair-tower');
  await page.goto(`/practicals/${practicalId}/variants/propose`);
  await expect(page.getByRole('heading', { name: 'No sizes found by the rule' })).toBeVisible();
  await expect(page.getByText('“block 1” stops the next one')).toBeVisible();
  await expectAccessible(page);
});
