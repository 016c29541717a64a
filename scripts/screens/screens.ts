import type { Page } from 'playwright/test';
import type { DemoAccount } from '../demo';

export type ScreenRole = 'public' | DemoAccount['role'];

/**
 * A screen of the product, for a picture of it in each size.
 *
 * To add one, add a line to the list below: who sees it, a name for its file, and its path. Where the path is not
 * known beforehand (a sitting, a student), give `go` instead: it starts on the role's home and walks there as a
 * person would, by links and buttons. The demo is the same every time, so titles and names can be relied on.
 * A page that answers with an error on purpose says so by its `status`.
 */
export type Screen = { role: ScreenRole; name: string; status?: number } & (
  | { path: string }
  | { go: (page: Page) => Promise<void> }
);

/** The practical on its desk, with one of its sheets on top. */
async function openPractical(page: Page, sheet?: string): Promise<void> {
  await page.goto('/practicals');
  await page.getByRole('link', { name: 'Desk caddy' }).first().click();
  await page.getByRole('heading', { name: 'What it gives' }).waitFor();
  if (sheet)
    await page.getByRole('navigation', { name: 'sheets' }).getByRole('link', { name: sheet }).click();
}

/** The versions of a practical that has two, or one of them. */
async function openVersions(page: Page, version?: string): Promise<void> {
  await page.goto('/practicals');
  await page.getByRole('link', { name: 'Bench-hook kit', exact: true }).first().click();
  await page.getByRole('link', { name: 'version 1', exact: true }).click();
  await page.getByRole('link', { name: 'all versions' }).click();
  await page.getByRole('heading', { name: /^Versions of / }).waitFor();
  if (version) {
    await page.getByRole('link', { name: version, exact: true }).click();
    await page.getByRole('heading', { name: 'Cut list' }).waitFor();
  }
}

/** Opens the first of today's rounds, with a way of entry where one is named. */
async function openBench(page: Page, entry?: 'keypad' | 'caliper'): Promise<void> {
  await page.goto('/round');
  await page.getByRole('link', { name: /^go on.*Stair tower, period 3/ }).click();
  await page.locator('[data-cell]').first().waitFor();
  if (entry) await page.getByRole('button', { name: entry, exact: true }).click();
}

/** Opens the practical that the student has at this stage, by the words of its next step. */
async function openTask(
  page: Page,
  step: RegExp,
  sheet: 'task' | 'measure' | 'result' | null,
): Promise<void> {
  await page.goto('/my');
  await page.getByRole('link', { name: step }).first().click();
  await page.waitForURL(/\/my\/.+/);
  if (!sheet) return;
  const address = page.url().replace(/\/(measure|result)$/, '');
  await page.goto(sheet === 'task' ? address : `${address}/${sheet}`);
}

/** Opens the roster of the teacher's period 3, or one of the sheets behind it. */
async function openRoster(page: Page, sheet: 'import' | 'slips' | null = null): Promise<void> {
  await page.goto('/periods');
  await page.getByRole('link', { name: /^Woods 2, period 3/ }).click();
  await page.getByRole('button', { name: 'add one' }).waitFor();
  if (sheet) await page.goto(`${page.url()}/${sheet}`);
}

/** Looks at a CSV that shows each kind of row; nothing is written. */
async function lookAtRoster(page: Page, text: string): Promise<void> {
  await openRoster(page, 'import');
  await page.getByText('CSV, with columns').click();
  await page.getByRole('textbox', { name: 'rows' }).fill(text);
  await page.getByRole('button', { name: 'look at the rows' }).click();
  await page.getByRole('button', { name: 'change the text' }).waitFor();
}

/** Opens the teacher's open sitting of period 3, or its sheet to publish from. */
async function openSitting(page: Page, sheet: 'publish' | null = null): Promise<void> {
  await page.goto('/sittings');
  await page.getByRole('link', { name: 'Stair tower, period 3', exact: true }).click();
  await page.getByRole('link', { name: 'publish' }).waitFor();
  if (sheet) await page.getByRole('link', { name: 'publish' }).click();
}

/** Looks at who would move if a sitting of the teacher's went to the other version of its practical. */
async function lookAtMove(page: Page, sitting: string): Promise<void> {
  await page.goto('/sittings');
  await page.getByRole('link', { name: sitting, exact: true }).click();
  await page.getByRole('link', { name: 'another version' }).click();
  await page.waitForURL(/\/move$/);
}

/** Opens the gradebook of the teacher's period 3. */
async function openGradebook(page: Page): Promise<void> {
  await page.goto('/periods');
  await page.getByRole('link', { name: 'gradebook of Woods 2, period 3' }).click();
  await page.getByRole('table', { name: 'students by practicals' }).waitFor();
}

const MIXED_ROSTER = `ID;family name;given name
00901;Novotná;Ilse
00902;Tran;Quynh
00380;Kowalczyk;K.
=2+3;Petrov;Anja
00901;Usman;Bilal
`;

const TO_DO = /^(look at the task|go on measuring|lock your readings)/;

export const SCREENS: Screen[] = [
  { role: 'public', name: 'sign-in', path: '/sign-in' },
  {
    role: 'public',
    name: 'sign-in-student',
    go: async (page) => {
      await page.goto('/sign-in');
      await page.getByText('student', { exact: true }).click();
    },
  },
  { role: 'public', name: 'forgotten-password', path: '/reset' },
  { role: 'public', name: 'reset-sent', path: '/reset?sent=yes' },
  { role: 'public', name: 'link-unknown', path: '/invitation/not-a-link' },
  { role: 'public', name: 'not-found', path: '/no-such-page', status: 404 },
  { role: 'teacher', name: 'home', path: '/' },
  { role: 'teacher', name: 'sittings', path: '/sittings' },
  { role: 'teacher', name: 'new-sitting', path: '/sittings/new' },
  { role: 'teacher', name: 'sitting', go: (page) => openSitting(page) },
  {
    role: 'teacher',
    name: 'sitting-student',
    go: async (page) => {
      await openSitting(page);
      await page
        .getByRole('button', { name: /^change / })
        .first()
        .click();
      await page.getByRole('dialog').waitFor();
    },
  },
  { role: 'teacher', name: 'publish', go: (page) => openSitting(page, 'publish') },
  { role: 'teacher', name: 'move-one-version', go: (page) => lookAtMove(page, 'Stair tower, period 3') },
  {
    role: 'teacher',
    name: 'move',
    go: async (page) => {
      await lookAtMove(page, 'Bench-hook kit, period 3');
      await page.getByRole('table', { name: 'who moves, in figures' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'move-confirm',
    go: async (page) => {
      await lookAtMove(page, 'Bench-hook kit, period 3');
      await page.getByRole('radio', { name: 'nobody drops' }).check();
      await page.getByRole('button', { name: /^move to version/ }).click();
      await page.getByRole('alertdialog').waitFor();
    },
  },
  { role: 'teacher', name: 'gradebook', go: openGradebook },
  {
    role: 'teacher',
    name: 'gradebook-cell',
    go: async (page) => {
      await openGradebook(page);
      await page
        .getByRole('button', { name: /, published/ })
        .nth(5)
        .click();
      await page.getByRole('table', { name: 'where the points went' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'gradebook-export',
    go: async (page) => {
      await openGradebook(page);
      await page.getByRole('button', { name: 'export CSV' }).click();
      await page.getByRole('dialog', { name: 'Export' }).waitFor();
    },
  },
  { role: 'head', name: 'gradebooks', path: '/gradebook' },
  { role: 'head', name: 'shared', path: '/department/shared' },
  {
    role: 'head',
    name: 'shared-version',
    go: async (page) => {
      await page.goto('/department/shared');
      await page.getByRole('link', { name: /what it would do.*version 1 of Desk caddy/ }).click();
      await page.getByRole('heading', { name: 'Declared differences' }).waitFor();
    },
  },
  { role: 'student', name: 'home', path: '/' },
  { role: 'head', name: 'home', path: '/' },
  { role: 'aide', name: 'home', path: '/' },
  { role: 'admin', name: 'home', path: '/' },
  { role: 'admin', name: 'people', path: '/school/people' },
  { role: 'admin', name: 'students', path: '/school/people?shown=students' },
  { role: 'admin', name: 'people-left', path: '/school/people?shown=left' },
  { role: 'admin', name: 'invite', path: '/school/people/invite' },
  {
    role: 'admin',
    name: 'person',
    go: async (page) => {
      await page.goto('/school/people');
      await page.getByRole('link', { name: 'Lindqvist, Rut' }).click();
      await page.getByRole('button', { name: 'mark as left' }).waitFor();
    },
  },
  { role: 'admin', name: 'sections', path: '/school/sections' },
  { role: 'admin', name: 'terms', path: '/school/terms' },
  { role: 'admin', name: 'departments', path: '/school/departments' },
  { role: 'admin', name: 'log', path: '/school/log' },
  { role: 'admin', name: 'school-settings', path: '/school/settings' },
  { role: 'admin', name: 'account', path: '/account' },
  { role: 'student', name: 'account', path: '/account' },
  { role: 'head', name: 'roles', path: '/account/role' },
  { role: 'teacher', name: 'rounds', path: '/round' },
  { role: 'aide', name: 'rounds', path: '/round' },
  { role: 'teacher', name: 'bench-rule', go: (page) => openBench(page) },
  { role: 'teacher', name: 'bench-keypad', go: (page) => openBench(page, 'keypad') },
  { role: 'teacher', name: 'bench-caliper', go: (page) => openBench(page, 'caliper') },
  {
    role: 'teacher',
    name: 'bench-students',
    go: async (page) => {
      await openBench(page);
      await page.getByRole('button', { name: /^student/ }).click();
    },
  },
  { role: 'teacher', name: 'practicals', path: '/practicals' },
  { role: 'teacher', name: 'practicals-put-away', path: '/practicals?put=away' },
  { role: 'teacher', name: 'new-practical', path: '/practicals/new' },
  { role: 'teacher', name: 'practical', go: (page) => openPractical(page) },
  { role: 'teacher', name: 'practical-task', go: (page) => openPractical(page, 'task') },
  { role: 'teacher', name: 'practical-rules', go: (page) => openPractical(page, 'total and rules') },
  {
    role: 'teacher',
    name: 'practical-reading',
    go: async (page) => {
      await openPractical(page);
      await page.getByLabel('length of base reads').fill('6 15/16');
      await page.getByRole('slider', { name: /^under, .*, edge of band 3$/ }).focus();
    },
  },
  {
    role: 'teacher',
    name: 'practical-example',
    go: async (page) => {
      await openPractical(page);
      await page.getByRole('button', { name: /^typical/ }).click();
    },
  },
  {
    role: 'teacher',
    name: 'variants',
    go: async (page) => {
      await openPractical(page);
      await page.getByRole('link', { name: 'variants with other sizes' }).click();
      await page.getByRole('button', { name: 'propose sizes' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'variants-proposed',
    go: async (page) => {
      await openPractical(page);
      await page.getByRole('link', { name: 'variants with other sizes' }).click();
      await page.getByRole('button', { name: 'propose sizes' }).click();
      await page.getByRole('heading', { name: 'variant B' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'practical-line',
    go: async (page) => {
      await openPractical(page);
      await page.getByRole('button', { name: /^line 2, end/ }).click();
    },
  },
  {
    role: 'teacher',
    name: 'practical-checks',
    go: async (page) => {
      await openPractical(page);
      await page.getByRole('button', { name: /^checks, all lines/ }).click();
    },
  },
  { role: 'teacher', name: 'versions', go: (page) => openVersions(page) },
  { role: 'teacher', name: 'version', go: (page) => openVersions(page, 'version 2') },
  {
    role: 'teacher',
    name: 'version-taken-back',
    go: async (page) => {
      await openVersions(page, 'version 1');
      await page.getByRole('button', { name: 'take it back into my draft' }).click();
      await page.getByRole('dialog').waitFor();
    },
  },
  { role: 'teacher', name: 'practical-file', path: '/practicals/import' },
  {
    role: 'teacher',
    name: 'practical-file-faults',
    go: async (page) => {
      await page.goto('/practicals/import');
      await page.getByRole('textbox').fill('{"trymark": "practical", "version": 1, "task": {"titel": 1}}');
      await page.getByRole('button', { name: 'make the practical' }).click();
      await page.getByRole('table', { name: 'what cannot be used' }).waitFor();
    },
  },
  { role: 'head', name: 'department', path: '/department' },
  {
    role: 'head',
    name: 'compare',
    go: async (page) => {
      await page.goto('/department');
      await page.getByRole('form', { name: 'rubrics of Desk caddy' }).getByRole('button').click();
      await page.getByRole('heading', { name: /^Desk caddy, / }).waitFor();
    },
  },
  { role: 'student', name: 'practicals', path: '/my' },
  { role: 'student', name: 'task', go: (page) => openTask(page, TO_DO, 'task') },
  {
    role: 'student',
    name: 'measure',
    go: async (page) => {
      await openTask(page, TO_DO, 'measure');
      await page.getByRole('group', { name: 'keys' }).waitFor();
    },
  },
  { role: 'student', name: 'result', go: (page) => openTask(page, /^see your result/, null) },
  {
    role: 'student',
    name: 'receipt',
    go: async (page) => {
      await openTask(page, /^see your result/, 'measure');
      await page.getByText('Your predicted score').waitFor();
    },
  },
  { role: 'teacher', name: 'new-period', path: '/periods/new' },
  { role: 'teacher', name: 'roster', go: (page) => openRoster(page) },
  {
    role: 'teacher',
    name: 'roster-add',
    go: async (page) => {
      await openRoster(page);
      await page.getByRole('button', { name: 'add one' }).click();
    },
  },
  {
    role: 'teacher',
    name: 'roster-student',
    go: async (page) => {
      await openRoster(page);
      await page.getByRole('rowheader').getByRole('link').first().click();
      await page.getByRole('button', { name: 'mark as left' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'new-words',
    go: async (page) => {
      await openRoster(page);
      await page.getByRole('rowheader').getByRole('link').last().click();
      await page.getByRole('button', { name: 'make new words' }).click();
      await page.getByRole('list', { name: 'the new words' }).waitFor();
    },
  },
  {
    role: 'teacher',
    name: 'modified',
    go: async (page) => {
      await openRoster(page);
      await page.goto(`${page.url()}/modified`);
    },
  },
  {
    role: 'teacher',
    name: 'modified-change',
    go: async (page) => {
      await openRoster(page);
      await page.goto(`${page.url()}/modified`);
      await page
        .getByRole('link', { name: /^change / })
        .first()
        .click();
      await page.getByRole('heading', { name: 'Change a modified rubric' }).waitFor();
    },
  },
  { role: 'head', name: 'modified', path: '/department/modified' },
  { role: 'teacher', name: 'slips', go: (page) => openRoster(page, 'slips') },
  { role: 'teacher', name: 'import', go: (page) => openRoster(page, 'import') },
  { role: 'teacher', name: 'import-rows', go: (page) => lookAtRoster(page, MIXED_ROSTER) },
  {
    role: 'teacher',
    name: 'import-columns',
    go: (page) => lookAtRoster(page, '00901;Novotná;Ilse\n00902;Tran;Quynh\n'),
  },
];
