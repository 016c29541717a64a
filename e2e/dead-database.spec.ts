import { type OwnServer, startOwnServer } from '@/tests/support/own-server';
import { expect, test } from './fixtures/test';

let server: OwnServer;

test.beforeAll(async () => {
  test.setTimeout(120_000);
  server = await startOwnServer('dead-database');
});

test.afterAll(() => server?.end());

// The browser notes every answer that says the server cannot help now.
test.use({ expectedErrors: /status of 50[03]|React error #441/ });

test('while the database is away pages say so and nothing typed is lost; when it is back all goes on by itself', async ({
  page,
  context,
  request,
}) => {
  await page.goto(`${server.url}/sign-in`);
  await page.getByLabel('email').fill('nobody@school.example');
  await page.getByLabel('password', { exact: true }).fill('not the password');
  await server.stopDatabase();

  await page.getByRole('button', { name: 'sign in' }).click();
  await expect(page.getByText('The database does not answer')).toBeVisible();
  await expect(page.getByLabel('email')).toHaveValue('nobody@school.example');
  expect((await request.get(`${server.url}/api/health`)).status()).toBe(503);

  const visitor = await context.newPage();
  await context.addCookies([
    {
      name: '__Host-trymark',
      value: 'somebody',
      domain: '127.0.0.1',
      path: '/',
      secure: true,
      httpOnly: true,
    },
  ]);
  const answer = await visitor.goto(`${server.url}/`);
  expect(answer?.status()).toBe(500);
  await expect(visitor.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(visitor.getByText(/ECONNREFUSED|postgres|at .*\.js/)).toHaveCount(0);

  await server.startDatabase();
  await expect.poll(async () => (await request.get(`${server.url}/api/health`)).status()).toBe(200);
  await page.getByLabel('password', { exact: true }).fill('not the password');
  await page.getByRole('button', { name: 'sign in' }).click();
  await expect(page.getByText('do not belong together')).toBeVisible();
  await visitor.reload();
  await expect(visitor).toHaveURL(`${server.url}/sign-in`);
});
