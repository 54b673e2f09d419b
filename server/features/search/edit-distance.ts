/**
 * The least number of letters to add, leave out, change or swap with a neighbour to make one word of another (optimal string alignment).
 * Source: Damerau 1964, doi 10.1145/363958.363994, with each letter touched once.
 * @example editDistance('ruthenuim', 'ruthenium') // 1
 */
export function editDistance(a: string, b: string): number {
  let [before, last]: [number[], number[]] = [[], Array.from({ length: b.length + 1 }, (_, j) => j)];
  for (let i = 1; i <= a.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const same = a[i - 1] === b[j - 1] ? 0 : 1;
      let least = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + same);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) least = Math.min(least, (before[j - 2] ?? 0) + 1);
      row.push(least);
    }
    [before, last] = [last, row];
  }
  return last[b.length] ?? 0;
}
