import type { Page } from 'playwright/test';
import { targetAttempt } from '@/lib/practicals/example-attempts';
import { explainScore } from '@/lib/practicals/explain-score';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { type Rubric, scoreAttempt } from '@/lib/scoring';
import { makePerson, makeSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { PriceBoard } from './fixtures/price-board';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';
const LENGTH = 'all lines, length';
const EDGES = ['1/32', '1/16', '3/32'];

let board: PriceBoard;

test.beforeEach(async ({ page }) => {
  const school = await makeSchool();
  const teacher = await makePerson(school, ['teacher'], { password: PASSWORD });
  await signIn(page, { ...teacher, schoolCode: null, password: PASSWORD });
  await page.goto('/practicals');
  await page.getByRole('button', { name: 'copy the starter Desk caddy' }).click();
  await expect(page.getByRole('heading', { name: 'Desk caddy' })).toBeVisible();
  board = new PriceBoard(page, LENGTH);
  await expect(board.knife('over', 1)).toBeVisible();
});

const score = (page: Page, label: RegExp) =>
  page.getByRole('table', { name: 'scores of example attempts' }).getByRole('row', { name: label });

const openRules = async (page: Page) => {
  await page.getByRole('link', { name: 'total and rules' }).click();
  await expect(page.getByRole('heading', { name: 'Total' })).toBeVisible();
};
const openPrices = async (page: Page) => {
  await page.getByRole('link', { name: 'cut list and prices' }).click();
  await expect(board.knife('over', 1)).toBeVisible();
};

test.describe('on a desk and a tablet', () => {
  test('an edge is drawn by mouse, snaps, stops at its neighbours, and laid on one takes the band out', async ({
    page,
  }) => {
    const pitch = await board.pitch(13);
    await board.drawByMouse(board.knife('over', 3), pitch * 2.2);
    await board.expectBands('over', 'length', ['1/32', '1/16', '5/32']);
    await expect(score(page, /^every size one step over/)).toContainText('67');

    await board.drawByMouse(board.knife('over', 2), pitch * 9, false);
    await expect(page.getByText('Let go here and the band between is taken out.')).toBeVisible();
    await page.keyboard.press('Escape');
    await page.mouse.up();
    await board.expectBands('over', 'length', ['1/32', '1/16', '5/32']);

    await board.drawByMouse(board.knife('over', 2), pitch * 9);
    await board.expectBands('over', 'length', ['1/32', '5/32']);
    await page.getByRole('button', { name: 'take that back' }).filter({ visible: true }).click();
    await board.expectBands('over', 'length', ['1/32', '1/16', '5/32']);
  });

  test('an edge is moved by keys, a graduation or a coarser one, to either end, and taken out', async ({
    page,
  }) => {
    const third = board.knife('over', 3);
    await third.focus();
    await page.keyboard.press('ArrowRight');
    await board.expectBands('over', 'length', ['1/32', '1/16', '1/8']);
    await page.keyboard.press('Shift+ArrowRight');
    await board.expectBands('over', 'length', ['1/32', '1/16', '3/16']);
    await page.keyboard.press('Home');
    await board.expectBands('over', 'length', EDGES);
    await page.keyboard.press('ArrowLeft');
    await board.expectBands('over', 'length', EDGES);
    await page.keyboard.press('End');
    await expect(third).toHaveAttribute('aria-valuetext', 'five thirty-seconds of an inch over');
    await page.keyboard.press('Enter');
    await expect(board.field('over, length, band 3, within')).toBeFocused();
    await third.focus();
    await page.keyboard.press('Delete');
    await board.expectBands('over', 'length', ['1/32', '1/16']);
    await expect(board.knife('over', 2)).toBeFocused();
  });

  test('the stair is pressed for one more edge, and its prices are typed where they stand', async ({
    page,
  }) => {
    await board.pressStair(4, 13);
    await board.expectBands('over', 'length', ['1/32', '1/16', '3/32', '1/8']);
    await expect(
      page.getByText('A band to 1/8 is added: it loses 3, and what lies past it 4.'),
    ).toBeVisible();
    await page.getByRole('button', { name: 'split over, length, band 1' }).click();
    await board.expectBands('over', 'length', ['1/64', '1/32', '1/16', '3/32', '1/8']);
    await expect(board.field('over, length, band 2, points')).toHaveValue('0.5');
    const price = board
      .field(`price on the rule, under, ${LENGTH}, past the last band`)
      .filter({ visible: true });
    await price.fill('');
    await expect(price).toBeFocused();
    await price.fill('6');
    await expect(board.field('over, length, past the last band, points')).toHaveValue('6');
  });

  test('over and under are priced alike, or apart', async ({ page }) => {
    await page.getByText('each side by itself').click();
    await board.drawByMouse(board.knife('under', 3), -(await board.pitch(13)));
    await board.expectBands('under', 'length', ['1/32', '1/16', '1/8']);
    await board.expectBands('over', 'length', EDGES);
    await page.getByText('both sides alike').click();
    await expect(board.knife('under', 3)).toHaveAttribute('aria-valuenow', '-3');
  });

  test('a reading that is slid or typed loses what the engine says, in both scales, and adds up', async ({
    page,
  }) => {
    const read = parseDraft(starterDraft('desk-caddy'));
    if (!read.ok) throw new Error('the starter cannot be read');
    const base = read.rubric.lines[0];
    if (!base) throw new Error('no line');
    const said = page.locator('output').filter({ hasText: 'Reads' }).filter({ visible: true });
    const cells = (row: string) =>
      page
        .getByRole('table', { name: 'what this piece loses' })
        .getByRole('row', { name: row })
        .getByRole('cell');
    await board.reading.focus();
    await page.keyboard.press('Home');
    for (let step = -6; step <= 6; step++) {
      const ticks = base.target.length + step * 7_937_500;
      const { lost, score: total } = engineSays(read.rubric, ticks);
      await expect(board.reading).toHaveAttribute('aria-valuenow', String(step));
      await expect(cells('base loses, of 9')).toHaveText(lost);
      await expect(cells('score').last()).toHaveText(total);
      await page.keyboard.press('ArrowRight');
    }
    await page.keyboard.press('Shift+ArrowLeft');
    await expect(board.reading).toHaveAttribute('aria-valuenow', '4');
    await expect(said).toContainText('this length loses 3; base loses 3 of 9, 4.76 of 100.');

    const { x, y } = await board.middleOf(board.reading);
    await page.mouse.click(x - (await board.pitch(13)) * 2, y);
    await expect(said).toContainText('this length loses 1; base loses 1 of 9, 1.59 of 100.');

    await board.field('width of base reads').fill('3.25');
    await page.getByLabel('surface of base').selectOption('not good');
    await expect(said).toContainText('base loses 5 of 9, 7.94 of 100.');
    await board.field('length of base reads').fill('6 5/8');
    await expect(said).toContainText('base is gross and loses 9 of 9, 14.29 of 100.');
    await expect(cells('base loses, of 9')).toHaveText(['9', '14.29']);
  });

  test('each preset shows on the rule and in the examples at once', async ({ page }) => {
    await page.getByRole('button', { name: 'undersize doubles' }).click();
    await expect(board.field('under, length, past the last band, points')).toHaveValue('6');
    await expect(score(page, /^base .* short/)).toContainText('97');
    await page.getByRole('button', { name: 'oversize doubles' }).click();
    await expect(board.field('over, length, past the last band, points')).toHaveValue('6');
    await expect(board.field('under, length, past the last band, points')).toHaveValue('3');
    await expect(score(page, /^every size one step over/)).toContainText('33');
    await page.getByRole('button', { name: 'rate per step' }).click();
    const dialog = page.getByRole('dialog', { name: 'Rate per step' });
    await dialog.getByLabel('points a step').fill('1.5');
    await dialog.getByLabel('most that a size loses').fill('4.5');
    await dialog.getByRole('button', { name: 'write the bands' }).click();
    await expect(board.field('over, length, band 3, points')).toHaveValue('3');
    await expect(board.field('over, length, past the last band, points')).toHaveValue('4.5');
    await openRules(page);
    await page.getByText('start from 100, take off').click();
    await expect(page.getByText('Losses come off 100;', { exact: false })).toBeVisible();
    await expect(score(page, /^perfect/)).toContainText('100');
    await expect(score(page, /^base .* short/)).toContainText('99');
  });

  test('an example is opened, and its rows add up to its score in both scales', async ({ page }) => {
    await page.getByRole('button', { name: /^poor/ }).click();
    const dialog = page.getByRole('dialog', { name: /^poor/ });
    await expect(dialog.getByRole('row', { name: 'lost' }).getByRole('cell')).toHaveText(['24', '38.1']);
    const sums = [0, 0];
    for (const row of await dialog.locator('tbody tr').all()) {
      const texts = await row.getByRole('cell').allInnerTexts();
      sums[0] = (sums[0] ?? 0) + Math.round(Number(texts.at(-2)) * 100);
      sums[1] = (sums[1] ?? 0) + Math.round(Number(texts.at(-1)) * 100);
    }
    expect(sums).toEqual([2400, 3810]);
    await expect(dialog.getByRole('row', { name: 'score' })).toContainText('62');
    await expectAccessible(page);
  });

  test('what the review finds stands at its field, and one press settles it where that is clear', async ({
    page,
  }) => {
    const settle = async (text: RegExp, press: string) => {
      await expect(page.getByText(text).first()).toBeVisible();
      await page.getByRole('button', { name: press, exact: true }).first().click();
      await expect(page.getByText(text)).toHaveCount(0);
    };
    await settle(/^Over and under lose alike\./, 'make under twice as dear');
    await page.getByRole('button', { name: 'undersize doubles' }).click();

    await board.field('over, length, band 2, within').fill('5/128');
    await expect(
      page.getByText(/^Bands narrower than the 1\/64 in that is read: up to 5\/128 in/),
    ).toBeVisible();
    await board.field('over, length, band 2, within').fill('1/16');
    await board.field('over, length, band 1, within').fill('0');
    await settle(/^Only the reading margin is free over and under/, 'make the first band 1/32');
    await board.field('over, length, past the last band, points').fill('2');
    await settle(
      /^Past the last band over, a piece loses 2 of 9 points/,
      'let it lose 2.25 past the last band',
    );

    await page.getByLabel('points for a missing piece, all lines').fill('6');
    await settle(/^A missing piece loses 6 points, a poor one up to 9/, 'set it to the worth');
    await page.getByLabel('worth of a piece, all lines').fill('9.5');
    await expect(page.getByText('1 to look at').first()).toBeVisible();
    await openRules(page);
    await settle(/^What the pieces are worth together, 66\.5 points/, 'round to 0.5');
    await page.getByLabel('gross limit').fill('1/16');
    await settle(/^The bands reach 3\/32 in, but past 1\/16 in/, 'set the gross limit to 3/32');
    await page.getByLabel('deviations rounded to').fill('1/64');
    await settle(
      /^Deviations are rounded to 1\/64 in and have a reading margin/,
      'score as read, without rounding',
    );
    await page.getByText('start from 100, take off').click();
    await page.getByLabel('start from', { exact: true }).fill('20');
    await settle(
      /^The score starts at 20 points, but 4 of 7 pieces can lose 38/,
      'start from 38, scaled to what it was',
    );

    await openPrices(page);
    await page.getByLabel('width, side', { exact: true }).fill('3 1/2');
    await page.getByLabel('length, side', { exact: true }).fill('4');
    await expect(page.getByText(/^“end” and “side” are the same size/)).toBeVisible();
    await expect(page.getByRole('button', { name: /^publish version 1/ })).not.toHaveAttribute(
      'aria-disabled',
    );
    await expectAccessible(page);
  });

  test('the chance that an instrument prices a part in the next band stands beside the band', async ({
    page,
  }) => {
    const group = page.getByRole('group', { name: 'over and under: long and short' });
    await expect(group.getByText('4 in 1000', { exact: true })).toBeVisible();
    await expect(page.getByText('Rule: read to the nearest', { exact: false })).toBeVisible();
    await openRules(page);
    await page.getByLabel('reading margin').fill('0');
    await openPrices(page);
    await board.field('over, length, band 1, within').fill('1/128');
    await expect(page.getByText(/^Read with a rule \(1\/64 in\), about \d\d in 100 parts/)).toBeVisible();
  });

  test('what cannot be used is told at its field, the rule keeps the last price, and publishing leads there', async ({
    page,
  }) => {
    await board.field('over, length, band 2, within').fill('1/64');
    await board.field('over, length, band 3, points').fill('0.5');
    await page.getByLabel('worth of a piece, all lines').fill('2');
    await board.field('most this size loses').fill('3');
    for (const told of [
      'Each band reaches further than the one before it.',
      'A band takes no less than the one before it.',
      'The most a size can lose is at most the piece’s worth, 2.',
      'The rule shows the last price that could be read.',
    ]) {
      await board.field('over, length, band 1, within').focus();
      await expect(page.getByText(told, { exact: false }).first()).toBeVisible();
    }
    await expect(board.face).toBeVisible();
    await page.getByRole('button', { name: 'checks, all lines: square 1, surface 1' }).click();
    await page.getByRole('button', { name: /^publish version 1/ }).click();
    await expect(page.locator('input[aria-invalid="true"]:focus')).toBeVisible();
  });

  test('every rule of the whole says what it does to an example as it is changed', async ({ page }) => {
    await openRules(page);
    const effect = (rule: string) => page.locator(`[data-effect="${rule}"]`);
    await page.getByLabel('floor, in percent').fill('40');
    await expect(effect('floor')).toHaveText('A set with nothing in it scores 40.');
    await page.getByLabel('percent a day').fill('5');
    await page.getByLabel('percent at most').fill('20');
    await expect(effect('late')).toHaveText('The typical set scores 89, and 76 when it comes 3 days late.');
    await page.getByLabel('of first attempt and redo counts').selectOption('the mean of all');
    await expect(effect('redo')).toHaveText('First 62, then 97: 80 counts.');
    await page.getByLabel('pieces of a line').selectOption('all as the worst of them');
    await expect(effect('set')).toContainText('the line loses 2.');
    await expectAccessible(page);
  });

  test('holds in light and in dark', async ({ page }) => {
    for (const theme of ['light', 'dark']) {
      await page.evaluate((name) => {
        document.documentElement.dataset.theme = name;
      }, theme);
      await board.reading.focus();
      await page.keyboard.press('ArrowRight');
      await expectAccessible(page);
    }
  });
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true });

  test('an edge is drawn by finger, and so is a reading; each grip is wide enough', async ({ page }) => {
    const pitch = await board.pitch(11);
    await board.drawByFinger(board.knife('over', 3), pitch);
    await board.expectBands('over', 'length', ['1/32', '1/16', '1/8']);
    for (const band of [1, 2, 3]) {
      const box = await board.knife('over', band).boundingBox();
      expect(Math.min(box?.width ?? 0, box?.height ?? 0)).toBeGreaterThanOrEqual(24);
    }
    await board.drawByFinger(board.reading, (await board.pitch(13)) * 2);
    await expect(board.reading).toHaveAttribute('aria-valuenow', '2');
    await expectAccessible(page);
  });
});

/** What one base of that length loses with all else on target, by the engine alone: in points and of the total. */
function engineSays(rubric: Rubric, ticks: number): { lost: string[]; score: string } {
  const attempt = targetAttempt(rubric);
  const [piece] = attempt.pieces;
  if (piece) piece.sizes.length = { kind: 'value', ticks };
  const sheet = scoreAttempt(rubric, attempt);
  const { lost } = explainScore(rubric, sheet, 0);
  const plain = (points: number) => String(points / 100);
  return { lost: [plain(lost.points), plain(lost.ofTotal)], score: plain(sheet.score ?? -1) };
}
