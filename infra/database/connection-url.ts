/** Connection addresses of one server, for its different databases and accounts. */

/** `url` pointing at another database of the same server, as the same account. */
export function withDatabase(url: string, database: string): string {
  const changed = new URL(url);
  changed.pathname = `/${encodeURIComponent(database)}`;
  return changed.href;
}

/** `url` pointing at the same database, as another account. */
export function withAccount(url: string, account: string, password: string): string {
  const changed = new URL(url);
  changed.username = encodeURIComponent(account);
  changed.password = encodeURIComponent(password);
  return changed.href;
}

/** The database that `url` names; '' when it names none. */
export function databaseOf(url: string): string {
  return decodeURIComponent(new URL(url).pathname.slice(1));
}
