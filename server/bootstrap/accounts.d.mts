/** An account of this machine that child processes run as. */
export interface Account {
  name: string;
  uid: number;
  gid: number;
}

/** Whether this process is root. */
export const isRoot: boolean;
/** The account of that name or number, or null. */
export function findAccount(name: string): Account | null;
/** The account PostgreSQL runs as, or null for the present one. */
export function databaseAccount(dataDirectory: string): Account | null;
/** The account the web server runs as, or null for the present one. */
export function serverAccount(): Account | null;
/** Whether the account may enter a folder or use a file. */
export function mayUse(account: Account | null, path: string, right?: '-x' | '-r' | '-w'): boolean;
