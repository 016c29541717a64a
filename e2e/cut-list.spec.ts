import type { Locator, Page } from 'playwright/test';
import { makePerson, makeSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { Author } from './fixtures/author';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

let author: Author;

test.beforeEach(async ({ page }) => {
  const school = await makeSchool();
  const teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
  author = new Author(page);
  await page.goto('/practicals');
});

async function openStarter(page: Page, title = 'Bench-hook kit'): Promise<void> {
  await author.press(author.button(`copy the starter ${title}`));
  await expect(page.getByRole('heading', { name: title })).toBeVisible();
}

async function openEmpty(page: Page): Promise<void> {
  await author.press(author.link('new practical'));
  await author.typeInto(page.getByLabel('title'), 'Box');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'Box' })).toBeVisible();
  await author.press(author.link(/cut list and prices/));
}

const part = (page: Page, line: number) => page.getByLabel(`part, line ${line}`, { exact: true });
const parts = (page: Page) => page.getByLabel(/^part, line \d+$/);

async function expectParts(page: Page, names: string[]): Promise<void> {
  await expect(parts(page)).toHaveCount(names.length);
  for (const [index, name] of names.entries()) await expect(part(page, index + 1)).toHaveValue(name);
}

/** The answer to the save of a width; the word “kept” alone may still be about the one before. */
const savedOn = (page: Page, width: string) =>
  page.waitForResponse((response) => response.request().postData()?.includes(`"width":"${width}"`) ?? false);

/** What a spreadsheet leaves on the clipboard, pasted where the cursor is. */
async function paste(target: Locator, text: string): Promise<void> {
  await target.focus();
  await target.evaluate((element, plain) => {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', plain);
    element.dispatchEvent(new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true }));
  }, text);
}

const BAD: Record<number, string> = {
  17: 'part 17\t1\t1/2\twide\t3',
  80: 'part 80\t1.5\t1/2\t2\t3',
  160: '\t1\t1/2\t2\t3',
  240: 'part 240\t1\t1/3\t2\t3',
  399: 'part 399\t1\t1/2\t2\t-3',
};

function rowsOf(count: number): string {
  const rows = Array.from({ length: count }, (_, at) => BAD[at + 1] ?? `part ${at + 1}\t1\t1/2\t2\t3`);
  return ['part\tqty\tthickness\twidth\tlength', ...rows].join('\r\n');
}

test('of 400 pasted rows the five bad ones are told with the way to each, and none is lost', async ({
  page,
}) => {
  await openEmpty(page);
  await paste(author.button('add a line'), rowsOf(400));
  await expect(page.getByText('400 rows pasted into lines 1 to 400')).toBeVisible();
  await expect(parts(page)).toHaveCount(400);
  const toMend = page.getByRole('region', { name: 'to mend in the cut list' });
  await expect(toMend).toContainText('5 of 400 lines cannot be read yet');
  await expect(toMend).toContainText('at most 200 lines; these are 400. All are kept as typed');
  await expect(toMend.getByRole('link')).toHaveText([
    'line 17, width',
    'line 80, pieces',
    'line 160, name',
    'line 240, thickness',
    'line 399, length',
  ]);
  await author.press(toMend.getByRole('link', { name: 'line 17, width' }));
  const width = page.getByLabel('width, part 17', { exact: true });
  await expect(width).toBeFocused();
  await expect(width).toHaveValue('wide');
  await author.expectKept();
  await page.reload();
  await expect(parts(page)).toHaveCount(400);
  await expect(width).toHaveValue('wide');

  await author.press(author.button('remove lines 201 to 400'));
  await expect(parts(page)).toHaveCount(200);
  await expect(toMend).not.toContainText('at most 200 lines');
  await author.press(author.button('undo'));
  await expect(parts(page)).toHaveCount(400);
});

test('typing into a list of 200 lines keeps up with the fingers', async ({ page }) => {
  await openEmpty(page);
  const rows = Array.from(
    { length: 200 },
    (_, at) => `part ${at + 1}\t1\t3/4\t${1 + (at % 13)}\t${2 + (at % 17)}`,
  );
  await paste(author.button('add a line'), rows.join('\n'));
  await expect(parts(page)).toHaveCount(200);
  await author.expectKept();
  await page.evaluate(() => {
    const slow = window as unknown as { keyToPaint: number[] };
    slow.keyToPaint = [];
    new PerformanceObserver((list) => {
      for (const { name, duration } of list.getEntries())
        if (name === 'keydown') slow.keyToPaint.push(duration);
    }).observe({ type: 'event', durationThreshold: 16 } as PerformanceObserverInit);
  });
  await page.getByLabel('width, part 100', { exact: true }).focus();
  await page.keyboard.type('1 3/8 by 2', { delay: 80 });
  await expect(page.getByLabel('width, part 100', { exact: true })).toHaveValue('1 3/8 by 2');
  await author.expectKept();
  const waits = await page.evaluate(() => (window as unknown as { keyToPaint: number[] }).keyToPaint);
  console.log(`key to paint in a list of 200 lines, ms: ${waits.join(' ')}`);
  // web.dev, "Interaction to Next Paint": good up to 200 ms. A crowded machine only adds, so the quicker keys tell.
  const quicker = waits.sort((a, b) => a - b)[Math.floor(waits.length / 3)] ?? 0;
  expect(quicker).toBeLessThanOrEqual(200);
});

test('rows with a head, in another order, in another unit, parted by semicolons, and undone with one press', async ({
  page,
}) => {
  await openStarter(page);
  await paste(
    part(page, 2),
    'Qty;Part;Wood;Length (mm);Width;Thickness\n2;rail;pine;180;1,5;3/4"\n1;stile;pine;1\' 2-1/2";2;3/4',
  );
  await expectParts(page, ['base', 'rail', 'stile', 'guide']);
  await expect(page.getByLabel('length, rail', { exact: true })).toHaveValue('180 mm');
  await expect(page.getByLabel('width, rail', { exact: true })).toHaveValue('1,5');
  await expect(page.getByText('left out, for want of a column: Wood')).toBeVisible();
  await part(page, 1).focus();
  await page.keyboard.press('Control+z');
  await expectParts(page, ['base', 'hook', 'fence', 'guide']);
  await expect(page.getByLabel('length, hook', { exact: true })).toHaveValue('5');
});

test('a line is moved, copied, added and removed with keys, and each is taken back in turn', async ({
  page,
}) => {
  await openStarter(page);
  const keys = page.keyboard;
  await part(page, 2).focus();
  await keys.press('Alt+ArrowUp');
  await expectParts(page, ['hook', 'base', 'fence', 'guide']);
  await expect(part(page, 1)).toBeFocused();
  await keys.press('Alt+Shift+ArrowDown');
  await expectParts(page, ['hook', 'hook', 'base', 'fence', 'guide']);
  await keys.press('Alt+Delete');
  await keys.press('Control+Enter');
  await expectParts(page, ['hook', 'base', '', 'fence', 'guide']);
  await keys.press('Delete');
  await expectParts(page, ['hook', 'base', 'fence', 'guide']);
  for (let presses = 0; presses < 5; presses++) await keys.press('Control+z');
  await expectParts(page, ['base', 'hook', 'fence', 'guide']);

  await page.getByLabel('width, hook', { exact: true }).focus();
  await author.type('9');
  await keys.press('Escape');
  await expect(page.getByLabel('width, hook', { exact: true })).toHaveValue('1 1/4');
  await keys.press('ArrowDown');
  await expect(page.getByLabel('width, fence', { exact: true })).toBeFocused();
  await keys.press('ArrowRight');
  await expect(page.getByLabel('length, fence', { exact: true })).toBeFocused();
});

const handle = (page: Page, line: number) =>
  page.getByRole('button', { name: new RegExp(`^line ${line}, `) });

const said = (page: Page) => page.getByRole('region', { name: 'cut list and prices' }).getByRole('status');

async function middleOf(target: Locator): Promise<{ x: number; y: number }> {
  const box = await target.boundingBox();
  if (!box) throw new Error('there is nothing to take hold of');
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

test('a line is dragged by its number, an Escape leaves it where it was, and one press takes it back', async ({
  page,
}) => {
  await openStarter(page);
  const from = await middleOf(handle(page, 1));
  const to = await middleOf(handle(page, 3));
  const status = said(page);
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x, to.y + 8, { steps: 4 });
  await expect(status).toHaveText('base: would be line 3');
  await page.keyboard.press('Escape');
  await page.mouse.up();
  await expect(status).toHaveText('base stays line 1');
  await expectParts(page, ['base', 'hook', 'fence', 'guide']);

  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x, to.y + 8, { steps: 4 });
  await expect(status).toHaveText('base: would be line 3');
  await page.mouse.up();
  await expectParts(page, ['hook', 'fence', 'base', 'guide']);
  await expect(status).toHaveText('base is line 3 now');
  await author.press(author.button('undo'));
  await expectParts(page, ['base', 'hook', 'fence', 'guide']);
});

test.describe('with a finger', () => {
  test.use({ hasTouch: true });

  test('a line is dragged by its number, and the page does not run away under it', async ({ page }) => {
    await openStarter(page);
    const { x, y: from } = await middleOf(handle(page, 3));
    const { y: to } = await middleOf(handle(page, 1));
    const touch = await page.context().newCDPSession(page);
    const finger = (type: 'touchStart' | 'touchMove' | 'touchEnd', y?: number) =>
      touch.send('Input.dispatchTouchEvent', { type, touchPoints: y === undefined ? [] : [{ x, y }] });
    await finger('touchStart', from);
    for (let step = 1; step <= 4; step++) await finger('touchMove', from + ((to - 8 - from) * step) / 4);
    await expect(said(page)).toHaveText('fence: would be line 1');
    await finger('touchEnd');
    await expectParts(page, ['fence', 'base', 'hook', 'guide']);
    expect(await page.evaluate(() => window.scrollY)).toBe(0);
  });
});

test('the part in hand is drawn as it is typed, and as it last was while a size cannot be read', async ({
  page,
}) => {
  await page.setViewportSize({ width: 1440, height: 900 });
  await openStarter(page);
  const drawing = page.getByRole('region', { name: 'part in hand' }).getByRole('img');
  await author.typeInto(page.getByLabel('length, hook', { exact: true }), '6 1/2');
  await expect(drawing).toHaveAccessibleName(/^hook: .*length six and one half inches/);
  await author.typeInto(page.getByLabel('length, hook', { exact: true }), '6 1/');
  await expect(page.getByRole('region', { name: 'part in hand' })).toContainText(
    'Drawn as it was: the length cannot be read now.',
  );
  await expect(drawing).toHaveAccessibleName(/length six inches/);
  await expectAccessible(page);
});

test.describe('away from the server', () => {
  test.use({ expectedErrors: /Failed to load resource|ERR_INTERNET_DISCONNECTED|Failed to fetch/ });

  test('what is typed offline stays on the device through a reload, and is kept when the network is back', async ({
    page,
    context,
  }) => {
    await openStarter(page);
    await author.typeInto(page.getByLabel('width, hook', { exact: true }), '2');
    await author.expectKept();
    await context.setOffline(true);
    await author.typeInto(page.getByLabel('width, hook', { exact: true }), '1 7/8');
    await expect(page.getByText('not kept yet', { exact: false })).toBeVisible();
    await context.setOffline(false);
    await page.reload();
    await expect(page.getByLabel('width, hook', { exact: true })).toHaveValue('1 7/8');
    await author.expectKept();
    await page.evaluate(() => localStorage.clear());
    await page.reload();
    await expect(page.getByLabel('width, hook', { exact: true })).toHaveValue('1 7/8');
  });

  test('who was signed out meanwhile is told, loses nothing, and goes on after signing in', async ({
    page,
    context,
  }) => {
    await openStarter(page);
    const cookies = await context.cookies();
    await context.clearCookies();
    await author.typeInto(page.getByLabel('width, hook', { exact: true }), '1 5/8');
    await expect(page.getByRole('link', { name: 'sign in in another tab' })).toBeVisible();
    await expect(page.getByLabel('width, hook', { exact: true })).toHaveValue('1 5/8');
    await context.addCookies(cookies);
    await page.evaluate(() => window.dispatchEvent(new Event('focus')));
    await author.expectKept();
  });
});

test('the browser’s way back brings what was typed last, and another tab’s draft is offered beside it', async ({
  page,
  context,
}) => {
  await openStarter(page);
  const width = page.getByLabel('width, hook', { exact: true });
  await author.typeInto(width, '1 3/4');
  await author.press(author.link('practicals').first());
  await expect(page.getByRole('heading', { name: 'Practicals' })).toBeVisible();
  await page.goBack();
  await expect(width).toHaveValue('1 3/4');
  const keptHere = savedOn(page, '1 7/8');
  await author.typeInto(width, '1 7/8');
  await keptHere;

  const other = await context.newPage();
  await other.goto(page.url());
  const kept = savedOn(other, '2');
  await other.getByLabel('width, fence', { exact: true }).fill('2');
  await kept;
  await author.typeInto(width, '1 5/8');
  const dialog = page.getByRole('dialog', { name: 'Two drafts of this practical' });
  await expect(dialog.getByRole('row', { name: 'line 2, width 1 5/8 1 7/8' })).toBeVisible();
  await expect(dialog.getByRole('row', { name: 'line 3, width 1 1/4 2' })).toBeVisible();
  await author.press(dialog.getByRole('button', { name: 'take the one kept there' }));
  await expect(page.getByLabel('width, fence', { exact: true })).toHaveValue('2');
  await expect(width).toHaveValue('1 7/8');
});

test('a practical is copied from the editor as it is typed', async ({ page }) => {
  await openStarter(page);
  await author.typeInto(page.getByLabel('width, hook', { exact: true }), '1 7/8');
  await author.press(author.link(/^1 ?task/));
  await author.press(author.button('copy this practical'));
  await expect(page.getByRole('heading', { name: 'Bench-hook kit, copy' })).toBeVisible();
  await author.press(author.link(/cut list and prices/));
  await expect(page.getByLabel('width, hook', { exact: true })).toHaveValue('1 7/8');
});
