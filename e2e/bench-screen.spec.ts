import type { Page } from 'playwright/test';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { expectAccessible } from './fixtures/accessibility';
import { BenchTablet, takeSession } from './fixtures/bench';
import { expect, test } from './fixtures/test';

/** 15 mm at 132 CSS px an inch. */
const TOUCH_PX = 77.9;

let stage: RoundStage;
let tablet: BenchTablet;

test.beforeEach(async ({ page, context }) => {
  stage = await stageRound();
  await takeSession(context, stage, stage.teacher, 'teacher');
  tablet = new BenchTablet(page, stage);
});

interface Box {
  name: string;
  left: number;
  top: number;
  right: number;
  bottom: number;
}

function boxesOf(page: Page): Promise<Box[]> {
  return page.locator('main button:visible').evaluateAll((buttons) =>
    buttons.map((button) => {
      const { left, top, right, bottom } = button.getBoundingClientRect();
      const name = button.getAttribute('aria-label') ?? button.textContent ?? '';
      return { name, left, top, right, bottom };
    }),
  );
}

/** Lines that keys share may lie over each other. */
const SHARED_PX = 4;

function overlaps(boxes: readonly Box[]): string[] {
  return boxes.flatMap((a, index) =>
    boxes
      .slice(index + 1)
      .filter(
        (b) =>
          Math.min(a.right, b.right) - Math.max(a.left, b.left) > SHARED_PX &&
          Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top) > SHARED_PX,
      )
      .map((b) => `${a.name} over ${b.name}`),
  );
}

const READING_KEYS = [
  '[data-cell]:not([data-cell$="checks"])',
  '[role=toolbar] button',
  '[aria-label=keypad] button',
];

for (const entry of ['rule', 'keypad', 'caliper']) {
  test(`on a tablet nothing scrolls or overlaps and reading keys are 15 mm, by ${entry}`, async ({
    page,
  }) => {
    await tablet.open();
    await tablet.key(entry).click();
    const sizes = await page.evaluate(() => [
      document.documentElement.scrollWidth - window.innerWidth,
      document.documentElement.scrollHeight - window.innerHeight,
    ]);
    expect(sizes).toEqual([0, 0]);
    const boxes = await boxesOf(page);
    expect(overlaps(boxes)).toEqual([]);
    expect(boxes.filter(({ right, bottom }) => right > 1180 || bottom > 820)).toEqual([]);
    for (const selector of READING_KEYS) {
      for (const key of await page.locator(selector).all()) {
        const box = await key.boundingBox();
        expect(
          Math.min(box?.width ?? 0, box?.height ?? 0),
          String(await key.getAttribute('aria-label')),
        ).toBeGreaterThanOrEqual(TOUCH_PX);
      }
    }
  });
}

for (const light of ['light', 'dark', 'glare']) {
  test(`the bench and what opens on it can be used by everybody, ${light}`, async ({ page }) => {
    await tablet.open();
    await tablet.key('set up').click();
    await page.getByText(light, { exact: true }).click();
    await expect(page.locator('html')).toHaveAttribute('data-theme', light);
    await expectAccessible(page);
    await tablet.key('close').click();
    await expectAccessible(page);
    for (const entry of ['keypad', 'caliper']) {
      await tablet.key(entry).click();
      await expectAccessible(page);
    }
    await tablet.action('held').click();
    await expectAccessible(page);
    await page.getByRole('button', { name: /^student/ }).click();
    await expectAccessible(page);
    await page.getByRole('button', { name: /^kept/ }).click();
    await expectAccessible(page);
    await tablet.key('lock').click();
    await expectAccessible(page);
  });
}
