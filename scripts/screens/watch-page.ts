import type { Page } from 'playwright/test';

/** Collects what a page complains about: errors in its console, uncaught ones, answers that failed. */
export function watchPage(page: Page, { expectedStatus }: { expectedStatus?: number | undefined }): string[] {
  const problems: string[] = [];
  page.on('console', (message) => {
    const isExpected = expectedStatus !== undefined && message.text().includes(`status of ${expectedStatus}`);
    if (message.type() === 'error' && !isExpected) problems.push(`console: ${message.text()}`);
  });
  page.on('pageerror', (error) => problems.push(`uncaught: ${error.message}`));
  page.on('response', (response) => {
    if (response.status() >= 400 && response.status() !== expectedStatus) {
      problems.push(`${response.status()} from ${response.url()}`);
    }
  });
  return problems;
}
