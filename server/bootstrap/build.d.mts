/** Builds the parts that are older than their sources. */
export function buildWhatIsStale(options?: { always?: boolean }): Promise<void>;
