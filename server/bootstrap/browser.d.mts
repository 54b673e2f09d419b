/** The browser's program, or null. */
export function findBrowser(): string | null;
/** The browser's program; installed when there is none. */
export function ensureBrowser(): Promise<string>;
