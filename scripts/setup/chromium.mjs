import { chromiumPath } from './packages.mjs';

/** How Debian's Chromium is started everywhere here: without a sandbox of its own, a screen, or calls to its makers. */
export const chromiumLaunch = {
  executablePath: chromiumPath,
  args: [
    '--no-sandbox',
    '--disable-gpu',
    '--disable-background-networking',
    '--disable-component-update',
    '--disable-sync',
    '--no-first-run',
  ],
};
