/** Throws when Node.js is older than the pinned packages allow. */
export function checkNodeVersion(version?: string): void;
