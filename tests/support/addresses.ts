/** The throw-away PostgreSQL cluster that the test runner starts. */
export const templateDatabase = 'cairnstep_template';
export const loginPassword = 'a-password-for-tests-only';

export function adminUrl(): string {
  const url = process.env['TEST_DATABASE_ADMIN_URL'];
  if (!url)
    throw new Error('Run these tests with `npm run test:api` (or :database, :sign-in), which starts a PostgreSQL cluster for them.');
  return url;
}
