/**
 * The accounts of this machine that child processes run as.
 *
 * PostgreSQL refuses to run as root, and a web server should not, so a start by root hands both to unprivileged accounts.
 * A start by anybody else runs everything as that person.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync, statSync } from 'node:fs';
import { SetupError } from './say.mjs';

/**
 * @typedef {{ name: string, uid: number, gid: number }} Account
 */

/** Whether this process is root. */
export const isRoot = process.getuid?.() === 0;

// What root makes here is read by the unprivileged accounts below; what is secret names its own narrower rights.
if (isRoot) process.umask(0o022);

/**
 * The account of that name or number, or null when the machine has none.
 * @param {string} name
 * @returns {Account | null}
 */
export function findAccount(name) {
  const local = readFileSync('/etc/passwd', 'utf8').split('\n').map((line) => line.split(':')).find((fields) => fields[0] === name || fields[2] === name);
  if (local?.[0]) return { name: local[0], uid: Number(local[2]), gid: Number(local[3]) };
  // Accounts may also come from a directory service; only the system knows those.
  const ask = (/** @type {string} */ flag) => spawnSync('id', [flag, name], { encoding: 'utf8' });
  const [uid, gid, label] = [ask('-u'), ask('-g'), ask('-un')];
  if (uid.status !== 0 || gid.status !== 0) return null;
  return { name: label.status === 0 ? label.stdout.trim() : name, uid: Number(uid.stdout), gid: Number(gid.stdout) };
}

/**
 * The account PostgreSQL runs as, or null for the present one. A data folder that exists belongs to whoever made it.
 * @param {string} dataDirectory
 * @returns {Account | null}
 */
export function databaseAccount(dataDirectory) {
  const owner = statSync(dataDirectory, { throwIfNoEntry: false })?.uid;
  if (!isRoot) {
    if (owner !== undefined && owner !== process.getuid?.()) {
      throw new SetupError(`The database in ${dataDirectory} belongs to another account. Start Sillstone as that account, or name another folder in SILLSTONE_DATA_DIR.`);
    }
    return null;
  }
  const account = owner ? findAccount(String(owner)) ?? { name: String(owner), uid: owner, gid: owner } : findAccount('postgres') ?? findAccount('nobody');
  if (!account) throw new SetupError('PostgreSQL does not run as root and this machine has no account "postgres" or "nobody". Make one, or start Sillstone as an ordinary user.');
  return account;
}

/**
 * The account the web server runs as, or null for the present one.
 * It is not the one of PostgreSQL, whose account could change the database's files behind its back.
 * @returns {Account | null}
 */
export function serverAccount() {
  return isRoot ? findAccount('nobody') ?? findAccount('postgres') : null;
}

/**
 * Whether the account may enter a folder or read a file (asked of the system, since rights of every parent count).
 * @param {Account | null} account
 * @param {string} path
 * @param {'-x' | '-r' | '-w'} right
 */
export function mayUse(account, path, right = '-x') {
  return spawnSync('test', [right, path], { cwd: '/', ...(account ? { uid: account.uid, gid: account.gid } : {}) }).status === 0;
}
