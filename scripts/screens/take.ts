import { mkdir } from 'node:fs/promises';
import { dirname } from 'node:path';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright/test';
import { z } from 'zod';
import { signIn } from '@/tests/support/sign-in';
import { demoAccountsOf } from '../demo';
import { SCREENS, type Screen, type ScreenRole } from './screens';
import { watchPage } from './watch-page';

/** Takes a picture of every screen in every size, and fails when one of them reports an error or runs over its width. */
const SIZES = {
  tablet: { width: 1180, height: 820 },
  phone: { width: 390, height: 844 },
  desktop: { width: 1440, height: 900 },
} as const;

type Size = keyof typeof SIZES;

const settings = z
  .object({
    APP_URL: z.string(),
    DATABASE_URL: z.string(),
    SCREENS_FOLDER: z.string(),
    SCREENS_LAUNCH: z.string(),
  })
  .parse(process.env);
const launch = z.object({ executablePath: z.string(), args: z.array(z.string()) });

/** `npm run screens -- teacher phone` takes only those whose role, name or size has all of these words. */
const wanted = process.argv.slice(2);
const isWanted = (size: Size, { role, name }: Screen) =>
  wanted.every((word) => `${size} ${role}-${name}`.includes(word));

const complaints: string[] = [];
const states = new Map<ScreenRole, Awaited<ReturnType<BrowserContext['storageState']>>>();

async function openContext(browser: Browser, size: Size, role: ScreenRole): Promise<BrowserContext> {
  const storageState = role === 'public' ? undefined : await signedIn(browser, role);
  return browser.newContext({
    baseURL: settings.APP_URL,
    viewport: SIZES[size],
    hasTouch: size !== 'desktop',
    reducedMotion: 'reduce',
    locale: 'en-US',
    ...(storageState ? { storageState } : {}),
  });
}

async function signedIn(browser: Browser, role: Exclude<ScreenRole, 'public'>) {
  const known = states.get(role);
  if (known) return known;
  const account = (await demoAccountsOf(settings.DATABASE_URL)).find((each) => each.role === role);
  if (!account) throw new Error(`The demo has no ${role}.`);
  const context = await browser.newContext({ baseURL: settings.APP_URL });
  await signIn(await context.newPage(), account);
  const state = await context.storageState({ indexedDB: true });
  await context.close();
  states.set(role, state);
  return state;
}

async function takeScreen(context: BrowserContext, size: Size, screen: Screen): Promise<void> {
  const label = `${size} ${screen.role}-${screen.name}`;
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  const problems = watchPage(page, { expectedStatus: screen.status });
  try {
    await arrive(page, screen);
    await page.evaluate(() => document.fonts.ready);
    // A head that keeps in view would lie over the middle of a whole page.
    await page.evaluate(() => window.scrollTo({ top: 0, behavior: 'instant' }));
    const file = `${settings.SCREENS_FOLDER}/${size}/${screen.role}-${screen.name}.png`;
    await mkdir(dirname(file), { recursive: true });
    await page.screenshot({ path: file, fullPage: true, animations: 'disabled', caret: 'hide' });
    problems.push(...(await overflowOf(page)));
  } catch (error) {
    problems.push(error instanceof Error ? error.message : String(error));
  } finally {
    await page.close();
  }
  complaints.push(...problems.map((problem) => `${label}: ${problem}`));
}

async function arrive(page: Page, screen: Screen): Promise<void> {
  if ('path' in screen) {
    await page.goto(screen.path, { waitUntil: 'networkidle' });
    return;
  }
  await page.goto('/');
  await screen.go(page);
  await page.waitForLoadState('networkidle');
}

/** A page that can be pushed sideways, with the widest of what sticks out. */
async function overflowOf(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement;
    if (scrollWidth <= clientWidth) return [];
    const widest = [...document.querySelectorAll('body *')]
      .map((element) => ({ element, right: element.getBoundingClientRect().right }))
      .sort((a, b) => b.right - a.right)[0];
    const what = widest
      ? `<${widest.element.tagName.toLowerCase()} class="${widest.element.className}">`
      : '';
    return [`the page is ${scrollWidth - clientWidth} px wider than its window: ${what}`];
  });
}

const browser = await chromium.launch(launch.parse(JSON.parse(settings.SCREENS_LAUNCH)));
let taken = 0;
for (const size of ['tablet', 'phone', 'desktop'] as const) {
  const screens = SCREENS.filter((screen) => isWanted(size, screen));
  for (const role of new Set(screens.map((screen) => screen.role))) {
    const context = await openContext(browser, size, role);
    for (const screen of screens.filter((each) => each.role === role)) {
      await takeScreen(context, size, screen);
      taken += 1;
    }
    await context.close();
  }
}
await browser.close();
console.log(`${taken} pictures in ${settings.SCREENS_FOLDER}`);
for (const complaint of complaints) console.log(complaint);
process.exitCode = complaints.length === 0 && taken > 0 ? 0 : 1;
