import type { Page } from 'playwright/test';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { ownerSql } from '@/tests/support/database';
import { makePractical, makeSitting } from '@/tests/support/factories';
import { makePerson, makeSchool, makeSection } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { starter } from '@/tests/support/variant-examples';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

/** A school that measures in one unit, with a practical given to a student. */
async function stage(unit: 'in' | 'mm', id: StarterId) {
  const school = await makeSchool();
  await ownerSql()`update schools set unit = ${unit} where id = ${school.id}`;
  const teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  const student = await makePerson(school, ['student'], { password: PASSWORD });
  const practical = await makePractical(school, teacher.personId, starter(id));
  const sectionId = await makeSection(school, {
    teacherIds: [teacher.personId],
    studentIds: [student.personId],
  });
  const { sittingId } = await makeSitting(school, sectionId, practical, {
    openedBy: teacher.personId,
    studentIds: [student.personId],
  });
  return { school, teacher, student, practicalId: practical.practicalId, sittingId };
}

/** No fraction, no inch: neither to be read nor to be heard. */
async function expectNoInch(page: Page): Promise<void> {
  const main = page.getByRole('main');
  await expect(main).toBeVisible();
  const shown = (await main.textContent()) ?? '';
  const heard = await main
    .locator('[aria-label]')
    .evaluateAll((all) => all.map((each) => each.getAttribute('aria-label') ?? '').join('\n'));
  const typed = await main
    .locator('input:not([type=hidden])')
    .evaluateAll((all) => all.map((each) => (each instanceof HTMLInputElement ? each.value : '')).join('\n'));
  for (const text of [shown, heard, typed]) {
    // A share of readings is typed as 2/3.
    expect(text.replaceAll('2/3', '')).not.toMatch(/\d\/\d|\binch|\d in(?! all)\b|\d"/);
  }
}

test('a metric practical is metric on every screen', async ({ page }) => {
  const { teacher, student, school, practicalId, sittingId } = await stage('mm', 'wall-rack');
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
  await page.goto('/practicals/new');
  await expect(page.getByRole('radio', { name: 'millimetres' })).toBeChecked();
  await page.getByLabel('title').fill('Rail');
  await page.getByRole('button', { name: 'make the practical' }).click();
  await expect(page.getByRole('heading', { name: 'Rail' })).toBeVisible();
  for (const step of ['task', 'rules']) {
    await page.goto(`/practicals/${practicalId}?step=${step}`);
    await expect(page.getByRole('heading', { name: 'What it gives' })).toBeVisible();
    await expectNoInch(page);
  }
  await page.goto(`/practicals/${practicalId}/variants/propose`);
  await expect(page.getByRole('heading', { name: 'variant B' })).toBeVisible();
  await expectNoInch(page);
  await page.goto(`/round/${sittingId}`);
  await expect(page.locator('[data-cell]').first()).toBeVisible();
  await expectNoInch(page);

  await page.context().clearCookies();
  await signIn(page, { ...student, schoolCode: school.code, password: PASSWORD });
  await page.goto(`/my/${sittingId}`);
  await expect(page.getByRole('heading', { name: 'post, length' })).toBeVisible();
  const sizes = page.getByRole('checkbox', { name: 'sizes in inches too' });
  await expect(sizes).not.toBeChecked();
  await expect(page.getByText('1.3780 in')).toHaveCount(0);

  await sizes.check();
  await expect(page.getByText('For information; measured and priced in millimetres.')).toBeVisible();
  await expect(page.getByRole('button', { name: /^thickness/ })).toContainText('about 1.3780 in');
  await expectAccessible(page);
});

test('a student reads inch sizes in millimetres too, exactly, on this device and until switched off', async ({
  page,
}) => {
  const { student, school, sittingId } = await stage('in', 'desk-caddy');
  await signIn(page, { ...student, schoolCode: school.code, password: PASSWORD });
  await page.goto(`/my/${sittingId}`);
  const sizes = page.getByRole('checkbox', { name: 'sizes in millimetres too' });
  await expect(page.getByText('12.7 mm')).toHaveCount(0);
  await sizes.check();
  await expect(page.getByRole('button', { name: /^thickness/ })).toContainText('12.7 mm');
  await expect(page.getByText(/^15\.875\s×\s+by\s152\.4\s×\s+by\s571\.5\smm$/)).toBeVisible();
  await expect(page.getByText('3.175 mm')).toBeVisible();
  // Bands are priced in inches alone.
  await expect(page.getByRole('table', { name: 'what each step off costs' })).not.toContainText('mm');
  await expectAccessible(page);

  await page.reload();
  await expect(sizes).toBeChecked();
  await page.goto(`/my/${sittingId}/measure`);
  await expect(page.getByText('target: 12.7 mm')).toBeVisible();
  await expectAccessible(page);
  await sizes.uncheck();
  await expect(page.getByText('target: 12.7 mm')).toHaveCount(0);
  await page.reload();
  await expect(page.getByRole('group', { name: 'keys' })).toBeVisible();
  await expect(sizes).not.toBeChecked();
});
