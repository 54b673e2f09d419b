/** The words of a free text that are looked for; the rest of a very long one is left. */
export const wordsOf = (q: string): string[] => q.split(/\s+/).filter(Boolean).slice(0, 12);
