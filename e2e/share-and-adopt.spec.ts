import type { Page } from 'playwright/test';
import { type Attempt, type Rubric, scoreAttempt } from '@/lib/scoring';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { comparedStarter } from '@/tests/support/compared';
import { ownerSql } from '@/tests/support/database';
import { makePractical, makeSitting, type TestPractical } from '@/tests/support/factories';
import {
  makePerson,
  makeSchool,
  makeSection,
  type TestPerson,
  type TestSchool,
} from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';
const REASON = 'Dividers are the whole point of a caddy.';

async function comeIn(page: Page, person: TestPerson): Promise<void> {
  await page.context().clearCookies();
  await signIn(page, { ...person, schoolCode: null, password: PASSWORD });
}

/** Every piece on target; of every second student one divider is missing. */
function workOf({ lines, workChecks }: Rubric, index: number): Attempt {
  const pieces = lines.flatMap(({ id, quantity, target }) =>
    Array.from({ length: quantity }, (_, nth) => ({
      lineId: id,
      ordinal: nth + 1,
      state: 'present' as const,
      sizes: {
        thickness: { kind: 'value' as const, ticks: target.thickness },
        width: { kind: 'value' as const, ticks: target.width },
        length: { kind: 'value' as const, ticks: target.length },
      },
      checks: {},
    })),
  );
  const last = pieces.at(-1);
  const short =
    last && index % 2 === 1
      ? [...pieces.slice(0, -1), { ...last, state: 'missing' as const, sizes: {} }]
      : pieces;
  return {
    pieces: short,
    work: Object.fromEntries(workChecks.map(({ id }) => [id, 0])),
    bonus: 0,
    daysLate: 0,
  };
}

/** A section of Rut's whose students have been read to the end. */
async function recordClass(school: TestSchool, teacher: TestPerson, practical: TestPractical, count: number) {
  const sql = ownerSql();
  const studentIds: string[] = [];
  for (let index = 0; index < count; index++)
    studentIds.push((await makePerson(school, ['student'])).personId);
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId], studentIds });
  const { attempts } = await makeSitting(school, sectionId, practical, {
    openedBy: teacher.personId,
    studentIds,
  });
  for (const [index, attemptId] of [...attempts.values()].entries()) {
    const recorded = workOf(practical.rubric, index);
    const sheet = scoreAttempt(practical.rubric, recorded);
    const json = (value: object) => sql.json(JSON.parse(JSON.stringify(value)));
    await sql`insert into score_sheets (school_id, attempt_id, side, rubric_version_id, engine_version, recorded, sheet,
        score_points, provisional_points, total_points, lost_points, complete, conflicts, finished)
      values (${school.id}, ${attemptId}, 'bench', ${practical.versionId}, ${ENGINE_VERSION}, ${json(recorded)},
        ${json(sheet)}, ${sheet.score}, ${sheet.provisional}, ${sheet.total}, ${sheet.lost}, ${sheet.complete}, 0, true)`;
  }
}

async function openPractical(page: Page): Promise<void> {
  await page.goto('/practicals');
  await page.getByRole('link', { name: 'Desk caddy', exact: true }).first().click();
  await expect(page.getByLabel('missing, divider')).toBeVisible();
}

async function setMissing(page: Page, points: string): Promise<void> {
  await page.getByLabel('missing, divider').fill(points);
  await expect(page.getByText(/^kept \d\d:\d\d$/)).toBeVisible();
}

async function publish(page: Page, number: number, reason?: string): Promise<void> {
  await page.getByRole('button', { name: `publish version ${number}` }).click();
  const dialog = page.getByRole('dialog', { name: `Publish version ${number}?` });
  if (reason) {
    await expect(dialog.getByText('A missing piece, divider: 6, the department 5.')).toBeVisible();
    await dialog.getByLabel('why').fill(reason);
    await expectAccessible(page);
  }
  await dialog.getByRole('button', { name: `publish version ${number}` }).click();
  await expect(page.getByRole('dialog', { name: `Version ${number} is published` })).toBeVisible();
}

test('a practical is offered, adopted, followed and left again, approved, and differed from with a reason', async ({
  page,
}) => {
  test.setTimeout(120_000);
  const school = await makeSchool();
  const rut = await makePerson(school, ['teacher'], {
    givenName: 'Rut',
    familyName: 'Lindqvist',
    password: PASSWORD,
  });
  const dayo = await makePerson(school, ['teacher'], {
    givenName: 'Dayo',
    familyName: 'Okonjo',
    password: PASSWORD,
  });
  const imre = await makePerson(school, ['head'], {
    givenName: 'Imre',
    familyName: 'Vass',
    password: PASSWORD,
  });
  const practical = await makePractical(school, rut.personId, comparedStarter('caddy'));
  await recordClass(school, rut, practical, 12);
  await recordClass(school, rut, await makePractical(school, rut.personId, comparedStarter('again')), 6);

  await test.step('Rut offers it', async () => {
    await comeIn(page, rut);
    await page.goto(`/practicals/${practical.practicalId}`);
    await page.getByRole('button', { name: 'offer Desk caddy to the department' }).click();
    await expect(page.getByRole('button', { name: 'withdraw Desk caddy from the department' })).toBeVisible();
    await expectAccessible(page);
  });

  await test.step('Dayo takes a copy and makes it otherwise', async () => {
    await comeIn(page, dayo);
    await page.goto('/practicals');
    await page.getByRole('button', { name: 'take a copy of Desk caddy by Rut Lindqvist' }).click();
    await expect(page.getByText('From Rut Lindqvist’s version 1.')).toBeVisible();
    await setMissing(page, '6');
  });

  await test.step('Rut publishes the next version', async () => {
    await comeIn(page, rut);
    await page.goto(`/practicals/${practical.practicalId}`);
    await setMissing(page, '5');
    await publish(page, 2);
  });

  await test.step('Dayo sees it, takes it over, and puts the own draft back', async () => {
    await comeIn(page, dayo);
    await page.goto('/practicals');
    await expect(page.getByText('from Rut Lindqvist’s version 1; version 2 is out')).toBeVisible();
    await expectAccessible(page);
    await openPractical(page);
    await expect(page.getByText('A missing piece, divider: now 5, was 9.')).toBeVisible();
    await page.getByRole('button', { name: 'take version 2 over' }).click();
    const dialog = page.getByRole('dialog', { name: 'Take version 2 over?' });
    await expect(dialog.getByText('A missing piece, divider: now 6, was 9.')).toBeVisible();
    await expectAccessible(page);
    await dialog.getByRole('button', { name: 'take version 2 over' }).click();
    await expect(page.getByLabel('missing, divider')).toHaveValue('5');
    await expect(page.getByText('From Rut Lindqvist’s version 2.')).toBeVisible();
    await page.getByRole('button', { name: 'put my draft back' }).click();
    await expect(page.getByLabel('missing, divider')).toHaveValue('6');
    await expect(page.getByText('From Rut Lindqvist’s version 1.')).toBeVisible();
    await page.reload();
    await expect(page.getByLabel('missing, divider')).toHaveValue('6');
  });

  await test.step('Imre sees what version 2 would do, and approves it', async () => {
    await comeIn(page, imre);
    await page.getByRole('link', { name: 'shared' }).click();
    await expect(page.getByRole('heading', { name: 'Shared practicals' })).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('link', { name: /what it would do.*version 2 of Desk caddy/ }).click();
    await expect(page.getByText('Period 3 would stand 3.0 higher.')).toBeVisible();
    const effect = page.getByRole('table', { name: 'mean score of each section' });
    await expect(effect.getByRole('row', { name: /Lindqvist’s version 1 12 93.0 96.0 \+3.0/ })).toBeVisible();
    await expect(effect.getByText('6 students: too few to show')).toBeVisible();
    await expect(
      page.getByRole('img', { name: /change of each student who moves: from 6 to 6/ }),
    ).toBeVisible();
    await expectAccessible(page);
    await page.getByRole('button', { name: 'approve it' }).click();
    const dialog = page.getByRole('alertdialog');
    await expect(dialog).toContainText('No sitting changes by this.');
    await expectAccessible(page);
    await dialog.getByRole('button', { name: 'approve version 2' }).click();
    await expect(page.getByText('This is the department’s rubric.')).toBeVisible();
    await expect(page.getByRole('heading', { name: 'Declared differences' })).toBeVisible();
  });

  await test.step('Dayo is told where the draft differs, and publishes it with a reason', async () => {
    await comeIn(page, dayo);
    await page.goto('/practicals');
    await expect(page.getByText('This is the department’s rubric.')).toBeVisible();
    await openPractical(page);
    await expect(page.getByText(/Rut Lindqvist’s version 2, approved by Imre Vass/)).toBeVisible();
    await publish(page, 1, REASON);
  });

  await test.step('Imre reads the difference and why, and ends the approval', async () => {
    await comeIn(page, imre);
    await page.goto('/department/shared');
    await page.getByRole('link', { name: /what it would do.*version 2 of Desk caddy/ }).click();
    const declared = page.getByRole('listitem').filter({ hasText: 'Dayo Okonjo' });
    await expect(declared).toContainText('A missing piece, divider: 6, the department 5.');
    await expect(declared).toContainText(REASON);
    await expectAccessible(page);
    await page.getByRole('button', { name: 'end the approval' }).click();
    await page.getByRole('alertdialog').getByRole('button', { name: 'end the approval' }).click();
    await expect(page.getByRole('button', { name: 'approve it' })).toBeVisible();
  });
});
