/**
 * The database's accounts. What each may do with which table is granted by the migrations; here they only come to be.
 *
 * cairnstep_owner    owns the database and everything in it; migrations act as it; nobody signs in as it
 * cairnstep_app      requests of signed-in people and systems; row-level security applies, for it owns nothing
 * cairnstep_session  sessions and sign-in
 * cairnstep_jobs     background work
 * cairnstep_login    the one account that signs in; inherits nothing, so a query outside a chosen role reaches nothing
 */
import { Client } from 'pg';
import { databaseOf, withAccount, withDatabase } from './connection-url.ts';

export const ownerRole = 'cairnstep_owner';
export const workRoles = ['cairnstep_app', 'cairnstep_session', 'cairnstep_jobs'] as const;
export const loginRole = 'cairnstep_login';
export const defaultDatabase = 'cairnstep';

/** Databases that every server has for its own purposes; an address that names one leaves the choice to us. */
const maintenanceDatabases = ['', 'postgres', 'template1'];
const maintenanceDatabase = 'postgres';

/** Any number, the same for all who ensure the roles of one server at the same time. */
const advisoryLock = 5_209_771;

export interface DatabaseAddresses {
  /** The administrator's address of the product's database: migrations and seed. */
  readonly databaseUrl: string;
  /** The login role's address of the same database: the running product. */
  readonly appUrl: string;
}

/** Creates a missing role, and refuses one that is there with powers that would undo row-level security. */
async function ensureRole(admin: Client, role: string, attributes: 'nologin' | 'login noinherit'): Promise<void> {
  const found = await admin.query<{ dangerous: boolean }>(
    'select rolsuper or rolbypassrls or rolcreaterole or rolcreatedb or rolreplication as dangerous from pg_roles where rolname = $1',
    [role],
  );
  const existing = found.rows[0];
  if (existing === undefined) await admin.query(`create role ${role} ${attributes}`);
  else if (existing.dangerous)
    throw new Error(`The database role ${role} exists with powers it must not have (see pg_roles). Take them away, then start again.`);
  else await admin.query(`alter role ${role} ${attributes}`);
}

/** Creates the database when missing; only the login role may connect to it. Requests sort what they are sent in temporary tables. */
async function ensureDatabase(admin: Client, database: string): Promise<void> {
  const name = admin.escapeIdentifier(database);
  const { rowCount } = await admin.query('select from pg_database where datname = $1', [database]);
  if (rowCount === 0) await admin.query(`create database ${name} owner ${ownerRole} template template0 encoding 'UTF8'`);
  await admin.query(`revoke all on database ${name} from public`);
  await admin.query(`grant connect on database ${name} to ${loginRole}`);
  // Rows of a submission arrive by COPY in a table of the transaction's own: COPY does not write where row-level security holds.
  await admin.query(`grant temporary on database ${name} to cairnstep_app`);
}

/**
 * Brings roles and database into being; running it again changes nothing but the login role's password.
 *
 * @param adminUrl address of an account that may create roles and databases. The database it names is the product's;
 *   when that is `postgres`, `template1` or none, the product's is `cairnstep`.
 * @param loginPassword what cairnstep_login signs in with from now on
 */
export async function ensureRoles(adminUrl: string, loginPassword: string): Promise<DatabaseAddresses> {
  const named = databaseOf(adminUrl);
  const database = maintenanceDatabases.includes(named) ? defaultDatabase : named;
  const admin = new Client({ connectionString: withDatabase(adminUrl, maintenanceDatabase) });
  await admin.connect();
  try {
    await admin.query('select pg_advisory_lock($1)', [advisoryLock]);
    for (const role of [ownerRole, ...workRoles]) await ensureRole(admin, role, 'nologin');
    await ensureRole(admin, loginRole, 'login noinherit');
    await admin.query(`alter role ${loginRole} password ${admin.escapeLiteral(loginPassword)}`);
    await admin.query(`grant ${workRoles.join(', ')} to ${loginRole}`);
    // A managed server's administrator is no superuser and can act as the owner only as its member.
    const { rows } = await admin.query<{ super: boolean }>('select rolsuper as super from pg_roles where rolname = current_user');
    if (rows[0]?.super !== true) await admin.query(`grant ${ownerRole} to current_user`);
    await ensureDatabase(admin, database);
  } finally {
    await admin.end();
  }
  const databaseUrl = withDatabase(adminUrl, database);
  return { databaseUrl, appUrl: withAccount(databaseUrl, loginRole, loginPassword) };
}
