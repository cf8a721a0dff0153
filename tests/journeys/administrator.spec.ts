/** An administrator brings a person in and out; the person meets what their role gives, and no more. */
import { look } from './looks.ts';
import { expect, test } from './support/journey.ts';
import { mailTo } from './support/mails.ts';
import { chooseAtProvider, signIn } from './support/sign-in.ts';

// Every page is looked at in four ways, which takes its time on a busy machine.
test.describe.configure({ timeout: 900_000 });

const guest = { name: 'Felix Brandt', email: 'felix.brandt@elsewhere.example' };

test('a person without a role sees whom to ask, and nothing else', async ({ page }) => {
  await signIn(page, guest.name);
  await expect(page).toHaveURL(/\/whom-to-ask$/);
  await expect(page.getByRole('heading', { level: 1, name: 'Nobody has given this account a role yet' })).toBeVisible();
  await look(page, 'administrator-no-role');
  await page.goto('/people');
  await expect(page).toHaveURL(/\/whom-to-ask$/);
});

test('invites a researcher by mail, who takes the role, works with it, and loses it at once', async ({
  page,
  browser,
  baseURL,
  listen,
}) => {
  await signIn(page, 'Ruth Adeyemi');
  await expect(page.getByRole('heading', { level: 1, name: 'People' })).toBeVisible();
  await page.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(page.getByRole('alert', { name: '2 things need mending' })).toBeFocused();
  await look(page, 'administrator-1-missing');

  await page.getByRole('textbox', { name: 'E-mail' }).fill(guest.email);
  await page
    .locator('label')
    .filter({ hasText: /^researcher/ })
    .click();
  await page.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(page.getByText(`Done. An invitation is on its way to ${guest.email}.`)).toBeVisible();
  await expect(page.getByRole('row', { name: new RegExp(`^${guest.email} researcher sent, not used yet`) })).toBeVisible();
  await look(page, 'administrator-2-invited');

  const mail = await mailTo(guest.email, /invitation/i);
  const link = mail.text.match(/https?:\/\/\S+\/invitation\/\S+/)?.[0];
  if (link === undefined) throw new Error('The invitation holds no link.');

  const elsewhere = await browser.newContext({
    ...(baseURL !== undefined && { baseURL }),
    locale: 'en-GB',
    timezoneId: 'Etc/UTC',
    reducedMotion: 'reduce',
  });
  listen(elsewhere);
  const theirs = await elsewhere.newPage();
  await theirs.goto(link);
  await expect(theirs.getByText('You are invited as researcher.')).toBeVisible();
  await look(theirs, 'administrator-3-invitation');
  await theirs.getByRole('link', { name: 'Sign in with your organisation' }).click();
  await chooseAtProvider(theirs, guest.name);
  await theirs.getByRole('button', { name: 'Take this role' }).click();
  await expect(theirs.getByRole('heading', { level: 1, name: /Explore/ })).toBeVisible();
  await theirs.goto('/people');
  await expect(theirs.getByRole('heading', { level: 1, name: 'Not for your role' })).toBeVisible();
  await theirs.goto(link);
  await expect(theirs.getByRole('alert')).toContainText('This invitation can no longer be used');

  await page.reload();
  await expect(page.getByRole('row', { name: new RegExp(`^${guest.email} researcher accepted`) })).toBeVisible();
  await page.getByRole('link', { name: guest.name }).click();
  await expect(page.getByRole('heading', { level: 1, name: guest.name })).toBeVisible();
  await look(page, 'administrator-4-person');
  await page.getByRole('button', { name: 'End the role researcher' }).click();
  await look(page, 'administrator-5-end-role');
  await page.getByRole('alertdialog').getByRole('button', { name: 'End the role' }).click();
  await expect(page.getByText('No role. The person can sign in and sees only whom to ask.')).toBeVisible();
  await theirs.goto('/explore');
  await expect(theirs).toHaveURL(/\/whom-to-ask$/);
  await elsewhere.close();

  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name: 'Audit' }).click();
  for (const act of ['role ended', 'invitation sent']) {
    await expect(page.getByRole('row', { name: new RegExp(`Ruth Adeyemi administrator ${act}`) }).first()).toBeVisible();
  }
  await look(page, 'administrator-7-audit');
});

test('cannot change the own account', async ({ page }) => {
  await signIn(page, 'Ruth Adeyemi');
  await page.getByRole('textbox', { name: 'Search' }).fill('ruth');
  await page.getByRole('link', { name: 'Ruth Adeyemi' }).click();
  await expect(page.getByText('Nobody can change their own roles or account.')).toBeVisible();
  await expect(page.getByRole('button', { name: /role|account/ })).toHaveCount(0);
  await look(page, 'administrator-6-own-account');
});
