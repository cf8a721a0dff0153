/** Whom PostgreSQL runs as: its programs refuse root, so root hands over to the account that Debian's package makes. */
import { execFileSync, spawnSync } from 'node:child_process';

export interface ServerUser {
  readonly uid: number;
  readonly gid: number;
}

const account = 'postgres';

/** The account to switch to, or undefined when this process is an ordinary user and stays who it is. */
export function serverUser(): ServerUser | undefined {
  if (process.getuid?.() !== 0) return undefined;
  const number = (flag: string): number => Number(execFileSync('id', [flag, account], { encoding: 'utf8' }).trim());
  return { uid: number('-u'), gid: number('-g') };
}

/** True when `user` (undefined: this process) may enter `folder`; false below a closed home folder. */
export function canEnter(user: ServerUser | undefined, folder: string): boolean {
  return spawnSync('test', ['-x', folder], { cwd: '/', ...user }).status === 0;
}
