import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url)).replace(/\/$/, '');
const resolve = {
  alias: {
    '@': root,
    'server-only': fileURLToPath(
      new URL('./node_modules/next/dist/compiled/server-only/empty.js', import.meta.url),
    ),
  },
};

export default defineConfig({
  test: {
    projects: [
      { resolve, test: { name: 'unit', include: ['tests/unit/**/*.test.{ts,tsx}'], environment: 'node' } },
      {
        resolve,
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/global-setup.ts'],
          setupFiles: ['tests/support/integration-file.ts'],
          maxWorkers: 2,
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
