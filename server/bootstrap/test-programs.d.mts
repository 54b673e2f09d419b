/** The browser's program, or null. */
export function findBrowser(): string | null;
/** Installs the programs only tests need, where they are missing. */
export function ensureTestPrograms(): Promise<void>;
