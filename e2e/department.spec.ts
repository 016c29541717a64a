import { comparedStarter } from '@/tests/support/compared';
import { makePractical } from '@/tests/support/factories';
import { makePerson, makeSchool } from '@/tests/support/school';
import { signIn } from '@/tests/support/sign-in';
import { expectAccessible } from './fixtures/accessibility';
import { expect, test } from './fixtures/test';

const PASSWORD = 'plane with the grain';

test('a head lays two teachers’ rubrics of one cut list side by side and reads where they differ', async ({
  page,
}) => {
  const school = await makeSchool();
  const head = await makePerson(school, ['head'], { password: PASSWORD });
  const rut = await makePerson(school, ['teacher'], { givenName: 'Rut', familyName: 'Lindqvist' });
  const dayo = await makePerson(school, ['teacher'], { givenName: 'Dayo', familyName: 'Okonjo' });
  await makePractical(school, rut.personId, comparedStarter('Lindqvist'));
  await makePractical(
    school,
    dayo.personId,
    comparedStarter('Okonjo', (draft) => {
      draft.all.sizes.length.under.beyond = '5';
      draft.redo.capPercent = '100';
    }),
  );
  await makePractical(
    school,
    rut.personId,
    comparedStarter('hook', () => {}, 'bench-hook'),
  );

  await signIn(page, { ...head, schoolCode: null, password: PASSWORD });
  await expect(page.getByRole('heading', { name: 'Rubrics in use' })).toBeVisible();
  await expect(page.getByText('one rubric: nothing to compare it with yet')).toBeVisible();
  await expectAccessible(page);

  await page.getByRole('button', { name: 'lay side by side' }).click();
  await expect(page.getByRole('heading', { name: 'Desk caddy, two rubrics' })).toBeVisible();
  await expect(
    page.getByText('Okonjo takes 2 points more than Lindqvist for every length under, past', {
      exact: false,
    }),
  ).toBeVisible();
  const table = page.getByRole('table', { name: 'where the rubrics differ' });
  await expect(table.getByRole('row', { name: /past .* under 3 5/ })).toBeVisible();
  await expect(table.getByRole('row', { name: 'a redo counts up to 90% 100%' })).toBeVisible();
  await expect(page.getByRole('img', { name: /Lindqvist.*Okonjo/ }).first()).toBeVisible();
  await expectAccessible(page);
});

test('rubrics that are the same say so, and rubrics of other pieces are refused with the reason', async ({
  page,
}) => {
  const school = await makeSchool();
  const head = await makePerson(school, ['head'], { password: PASSWORD });
  const rut = await makePerson(school, ['teacher'], { familyName: 'Lindqvist' });
  const dayo = await makePerson(school, ['teacher'], { familyName: 'Okonjo' });
  const first = await makePractical(school, rut.personId, comparedStarter('a'));
  const second = await makePractical(school, dayo.personId, comparedStarter('b'));
  const hook = await makePractical(
    school,
    rut.personId,
    comparedStarter('c', () => {}, 'bench-hook'),
  );
  await signIn(page, { ...head, schoolCode: null, password: PASSWORD });
  await page.goto(`/department/compare?versions=${first.versionId},${second.versionId}`);
  await expect(
    page.getByText('No difference: every reading costs the same under each of them.'),
  ).toBeVisible();
  await page.goto(`/department/compare?versions=${first.versionId}&versions=${hook.versionId}`);
  await expect(page.getByText('These rubrics ask for different pieces', { exact: false })).toBeVisible();
  await page.getByRole('link', { name: 'to the rubrics' }).click();
  await expect(page.getByRole('heading', { name: 'Rubrics in use' })).toBeVisible();
});
