import { wordsOf } from './free-words.ts';
import { publicRows } from './search.policy.ts';
import type { SearchEngine } from './search-engine.ts';

const bare = (word: string): string => word.replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, '');

/**
 * A near spelling of a free text: each word that nothing in the store has is replaced by the nearest that something has.
 * Null when all words are known, when one has no near spelling, or when nothing has them all.
 */
export async function nearSpelling(engine: SearchEngine, q: string): Promise<string | null> {
  const words = wordsOf(q);
  const near = await engine.nearWords(words.map(bare));
  if (near.size === 0) return null;
  const most = Math.max(...[...near.values()].map((found) => found.length));
  for (let choice = 0; choice < most; choice += 1) {
    const corrected = words.map((word) => {
      const found = near.get(bare(word));
      return found ? word.replace(bare(word), found[Math.min(choice, found.length - 1)] ?? '') : word;
    }).join(' ');
    if (await engine.total({ filter: { q: corrected }, visible: publicRows }) > 0) return corrected;
  }
  return null;
}
