import type { Page } from 'playwright/test';

/** Collects what a page complains about: errors in its console, uncaught ones, answers that failed. */
export function watchPage(page: Page): string[] {
  const problems: string[] = [];
  page.on('console', (message) => {
    const isOwnAnswer = message.location().url === page.url() && /status of 404/.test(message.text());
    if (message.type() === 'error' && !isOwnAnswer) problems.push(`console: ${message.text()}`);
  });
  page.on('pageerror', (error) => problems.push(`uncaught: ${error.message}`));
  page.on('response', (response) => {
    if (response.status() >= 500) problems.push(`${response.status()} from ${response.url()}`);
  });
  return problems;
}
