import { ownerSql } from '@/tests/support/database';
import { type RoundStage, sheetOf, stageRound } from '@/tests/support/round-stage';
import { BenchTablet, keptReadings, tabletFor, takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

let stage: RoundStage;
let tablet: BenchTablet;

test.beforeEach(async ({ page, context }) => {
  stage = await stageRound();
  await takeSession(context, stage, stage.teacher, 'teacher');
  tablet = new BenchTablet(page, stage);
});

test('six off-band sizes of 27 take 15 taps from the first cell to finish, and the server prices what was tapped', async () => {
  await tablet.open();
  const off: [string, string][] = [
    ['base/1/length', '6 15/16'],
    ['end/2/width', '3 9/16'],
    ['side/1/length', '6 29/32'],
    ['side/2/thickness', '19/32'],
    ['divider/2/length', '3 3/8'],
    ['divider/4/width', '2 1/16'],
  ];
  for (const [cell, graduation] of off) {
    await tablet.tap(tablet.cell(cell));
    await tablet.tap(tablet.graduation(graduation));
  }
  await tablet.tap(tablet.action('rest OK'));
  await tablet.tap(tablet.action('all good'));
  await tablet.tap(tablet.action('finish'));
  expect(tablet.taps).toBe(15);
  await expect(tablet.page.getByRole('heading', { name: 'Ben Brandt' })).toBeVisible();
  // 6 numbers, 21 gauged, 18 checks of pieces and one of the work, and the finish.
  await tablet.expectCounts(47, 47);
  expect(await sheetOf(stage.attempts[0])).toMatchObject({
    complete: true,
    finished: true,
    lost_points: 1000,
  });
});

test('all 27 sizes by number take 29 taps, the cursor going on by itself', async () => {
  await tablet.open();
  for (let count = 0; count < 27; count += 1) {
    await tablet.tap(tablet.page.getByRole('toolbar').getByRole('button', { name: /on target|^[^,]+, 0,/ }));
  }
  await expect(tablet.page.getByText('Every size is read.').first()).toBeVisible();
  await tablet.tap(tablet.action('all good'));
  await tablet.tap(tablet.action('finish'));
  expect(tablet.taps).toBe(29);
  await tablet.expectCounts(47, 47);
  expect(await sheetOf(stage.attempts[0])).toMatchObject({ complete: true, lost_points: 0 });
});

test.describe('without a network', () => {
  test.use({ expectedErrors: /ERR_INTERNET_DISCONNECTED|ERR_FAILED|Failed to fetch/ });

  test('rule, keypad and caliper go on, a reload loses nothing, and all of it arrives once', async ({
    page,
    context,
  }) => {
    await tablet.open();
    await tablet.graduation('17/32').click();
    await tablet.expectCounts(1, 1);

    await context.setOffline(true);
    await tablet.key('keypad').click();
    for (const key of ['3', 'and', '1', '7', '/32', 'keep']) await tablet.key(key).click();
    await tablet.key('caliper').click();
    await tablet.instrument('6.969');
    await expect(tablet.cursor).toHaveAttribute('data-cell', 'end/1/thickness');
    await tablet.instrument('0.515');
    await tablet.cell('side/1/width').click();
    await tablet.expectCounts(4, 1);
    await expect(page.getByText('to send')).toBeVisible();

    // The pages are there again, but the readings still do not get through.
    await page.route('**/events', (route) => route.abort());
    await context.setOffline(false);
    await page.reload();
    await expect(tablet.cursor).toHaveAttribute('data-cell', 'side/1/width');
    await tablet.expectCounts(4, 1);
    await expect(tablet.cell('base/1/length')).toHaveAccessibleName(/0\.031.* under/);

    await page.unroute('**/events');
    await page.evaluate(() => window.dispatchEvent(new Event('online')));
    await tablet.expectCounts(4, 4);
    expect(await keptReadings(stage.attempts[0])).toEqual([
      { cell: 'base/1/thickness', typed: '17/32', instrument: 'rule', kind: 'value' },
      { cell: 'base/1/width', typed: '3 17/32', instrument: 'keyed', kind: 'value' },
      { cell: 'base/1/length', typed: '6.969', instrument: 'caliper', kind: 'value' },
      { cell: 'end/1/thickness', typed: '0.515', instrument: 'caliper', kind: 'value' },
    ]);
  });

  test('undo reaches back past a reload', async ({ page }) => {
    await tablet.open();
    await tablet.graduation('17/32').click();
    await tablet.action('line OK').click();
    await tablet.expectCounts(3, 3);
    await page.reload();
    await tablet.action('undo').click();
    await tablet.action('undo').click();
    await expect(tablet.cursor).toHaveAttribute('data-cell', 'base/1/thickness');
    await tablet.expectCounts(6, 6);
    expect((await keptReadings(stage.attempts[0])).slice(3).map(({ kind }) => kind)).toEqual(
      Array(3).fill('cleared'),
    );
  });
});

test('an answer that is not the server’s own takes nothing off the tablet', async ({ page }) => {
  await tablet.open();
  await page.route('**/events', (route) =>
    route.fulfill({ status: 200, contentType: 'text/html', body: '<h1>Welcome to the guest network</h1>' }),
  );
  await tablet.graduation('17/32').click();
  await tablet.expectCounts(1, 0);
  await page.unroute('**/events');
  await tablet.graduation('3 17/32').click();
  await tablet.expectCounts(2, 2);
  expect(await keptReadings(stage.attempts[0])).toHaveLength(2);
});

test('two tablets that record one cell show two readings, and the teacher chooses one of them', async ({
  browser,
}) => {
  await tablet.open();
  const second = await tabletFor(browser, stage, stage.aide, 'aide');
  await second.tablet.open();
  await expect(tablet.page.getByText('also in hand')).toBeVisible();
  await expect(tablet.page.getByText('J. Pell')).toBeVisible();

  await second.context.setOffline(true);
  await second.tablet.graduation('9/16').click();
  await tablet.graduation('17/32').click();
  await tablet.expectCounts(1, 1);
  await second.context.setOffline(false);
  await second.tablet.page.evaluate(() => window.dispatchEvent(new Event('online')));
  await second.tablet.expectCounts(1, 1);

  await expect(tablet.cell('base/1/thickness')).toHaveAccessibleName(/two readings/);
  await expect.poll(async () => (await sheetOf(stage.attempts[0]))?.conflicts).toBe(1);
  await second.tablet.cell('base/1/thickness').click();
  await expect(second.tablet.page.getByText('The teacher chooses.')).toBeVisible();
  await expect(second.tablet.page.getByRole('button', { name: /Dayo Okonjo/ })).toBeDisabled();

  await tablet.cell('base/1/thickness').click();
  await tablet.page.getByRole('button', { name: /Jonah Pell/ }).click();
  await expect(tablet.cell('base/1/thickness')).toHaveAccessibleName(
    /one sixteenth of an inch over, loses 1/,
  );
  await expect.poll(async () => (await sheetOf(stage.attempts[0]))?.conflicts).toBe(0);
  await expect(second.tablet.cell('base/1/thickness')).toHaveAccessibleName(/over, loses 1/);
  expect(await keptReadings(stage.attempts[0])).toHaveLength(3);
  await second.context.close();
});

test('an aide goes on to the next student and has no finish', async ({ browser }) => {
  const { tablet: aide, context } = await tabletFor(browser, stage, stage.aide, 'aide');
  await aide.open();
  await expect(aide.action('finish')).toHaveCount(0);
  await aide.action('rest OK').click();
  await aide.action('next').click();
  await expect(aide.page.getByRole('heading', { name: 'Ben Brandt' })).toBeVisible();
  await aide.expectCounts(27, 27);
  expect(await sheetOf(stage.attempts[0])).toMatchObject({ finished: false });
  await context.close();
});

test('missing, held and spoiled take two taps and tell the server which and why; a held piece comes back', async ({
  page,
}) => {
  await tablet.open();
  await tablet.tap(tablet.action('missing'));
  await expect(page.getByText('What is missing?')).toBeVisible();
  await tablet.tap(tablet.key('base').last());
  await tablet.tap(tablet.action('held'));
  await tablet.tap(tablet.key('other name on it'));
  await tablet.tap(tablet.action('spoiled'));
  await tablet.tap(tablet.key('this thickness'));
  expect(tablet.taps).toBe(6);
  await tablet.expectCounts(3, 3);
  await expect(tablet.cell('base/1/piece')).toHaveAccessibleName('base: missing');
  await expect(tablet.cell('end/1/piece')).toHaveAccessibleName('end 1: held, other name on it');
  await tablet.cell('end/1/piece').click();
  await tablet.key('it is here').click();
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'end/1/thickness');
  await page.getByRole('button', { name: 'end 2, checks: assumed' }).click();
  await page.getByRole('button', { name: /out of square/ }).click();
  await expect(page.getByRole('button', { name: 'end 2, checks: square −1' })).toBeVisible();
});

test('a caliper left on millimetres is asked about once, a gross reading needs a second press, closed jaws step back', async ({
  page,
}) => {
  await tablet.open();
  await tablet.key('caliper').click();
  await tablet.instrument('0.000');
  await expect(page.getByText(/zero is good/)).toBeVisible();
  await tablet.instrument('12.7');
  await page.getByRole('button', { name: 'yes, 12.7 mm' }).click();
  await tablet.instrument('88.9');
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'base/1/length');
  await tablet.instrument('150');
  await expect(page.getByText(/past the gross limit/i).first()).toBeVisible();
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'base/1/length');
  await tablet.instrument('150.1');
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'end/1/thickness');
  await tablet.instrument('0');
  await tablet.instrument('0.01');
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'base/1/length');
  await expect
    .poll(async () => (await keptReadings(stage.attempts[0])).map(({ typed }) => typed))
    .toEqual(['0.000', '12.7', '88.9', '150.1', '0']);
});

test('the lock opens by the keys on the screen alone, waits after wrong PINs, and returns to the exact cell', async ({
  page,
}) => {
  await tablet.open();
  await tablet.cell('side/2/length').click();
  await tablet.key('lock').click();
  const enter = async (pin: string, last: string) => {
    for (const digit of pin) await tablet.key(digit).click();
    await tablet.key(last).click();
  };
  await enter('2580', 'keep');
  await enter('2580', 'keep');
  await expect(page.getByRole('heading', { name: 'Locked' })).toBeVisible();
  await tablet.instrument('2580');
  await expect(page.getByText('0 digits')).toBeAttached();
  await page.reload();
  await expect(page.getByRole('heading', { name: 'Locked' })).toBeVisible();
  for (const wrong of ['1111', '2222', '3333']) await enter(wrong, 'open');
  await expect(page.getByText(/Wait \d+ s/)).toBeVisible();
  await expect(tablet.key('1')).toBeEnabled();
  await enter('2580', 'open');
  await expect(tablet.cursor).toHaveAttribute('data-cell', 'side/2/length');
});

test('a student can be marked absent, skipped and come back to', async ({ page }) => {
  await tablet.open();
  await tablet.action('skip').click();
  await expect(page.getByRole('heading', { name: 'Ben Brandt' })).toBeVisible();
  await page.getByRole('button', { name: /^student/ }).click();
  await expect(page.getByRole('button', { name: /Ana Abbott/ })).toContainText('come back');
  await page.getByRole('button', { name: /^absent/ }).click();
  await expect(page.getByRole('heading', { name: 'Ana Abbott' })).toBeVisible();
  await expect
    .poll(async () => {
      const [row] = await ownerSql()`select standing from attempts where id = ${stage.attempts[1]}`;
      return row?.standing;
    })
    .toBe('absent');
});

test('a practice round runs on the same bench and sends nothing', async ({ page }) => {
  const sent: string[] = [];
  page.on('request', (request) => {
    if (request.url().includes('/api/')) sent.push(request.url());
  });
  await page.goto(`/practicals/${stage.practical.practicalId}/practice`);
  await expect(page.getByText('thrown away')).toBeVisible();
  await tablet.graduation('17/32').click();
  await tablet.action('rest OK').click();
  await tablet.action('all good').click();
  await tablet.action('finish').click();
  await expect(page.getByTestId('kept')).toHaveText('47');
  expect(sent).toEqual([]);
  await page.reload();
  await expect(page.getByTestId('kept')).toHaveText('0');
});

test.describe('the endpoint', () => {
  test.use({ expectedErrors: /status of 4(03|12|22)/ });

  test('refuses another version of the protocol whole, and what no page of its own sent', async ({
    page,
  }) => {
    await tablet.open();
    const url = `/api/sittings/${stage.sittingId}/events`;
    const statusOf = (protocol: number) =>
      page.evaluate(
        async ([address, version]) => {
          const body = JSON.stringify({ protocol: version, deviceId: crypto.randomUUID(), events: [] });
          const headers = { 'content-type': 'application/json' };
          return (await fetch(String(address), { method: 'POST', headers, body })).status;
        },
        [url, protocol],
      );
    expect(await statusOf(99)).toBe(412);
    expect(await statusOf(1)).toBe(422);
    const foreign = await page.request.post(url, { data: { protocol: 1 } });
    expect(foreign.status()).toBe(403);
  });
});
