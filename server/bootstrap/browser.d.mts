/** The browser's program, or null. */
export function findBrowser(): string | null;
