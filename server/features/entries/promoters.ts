/** Names of promoters that papers write out, with their symbols (common practice). */
const symbols = new Map(Object.entries({
  lithium: 'Li', sodium: 'Na', potassium: 'K', rubidium: 'Rb', caesium: 'Cs', cesium: 'Cs', magnesium: 'Mg', calcium: 'Ca', strontium: 'Sr', barium: 'Ba',
  lanthanum: 'La', cerium: 'Ce', praseodymium: 'Pr', samarium: 'Sm', yttrium: 'Y', aluminium: 'Al', aluminum: 'Al',
}));

/** Words beside a promoter that name none: amounts, and ways to say that there is none. */
const besides = new Set([
  'none', 'no', 'clean', 'unpromoted', 'without', 'promoter', 'promoted', 'by', 'of', 'per', 'and', 'with', 'to', 'at', 'on', 'in', 'the', 'a', 'atom', 'atoms', 'surface', 'site', 'sites',
  'ml', 'monolayer', 'monolayers', 'wt', 'mol', 'mole', 'ratio', 'ppm', 'percent', 'low', 'high', 'as', 'about', 'loading', 'coverage', 'mass', 'weight', 'fraction', 'nominal', 'metal',
]);

/** One promoter in the spelling it is kept and looked for by: a symbol where the name is known, else as typed. */
export function promoterWord(text: string): string {
  const plain = text.trim();
  const symbol = symbols.get(plain.toLowerCase());
  if (symbol) return symbol;
  return /^[a-z]{1,2}$/i.test(plain) ? plain.charAt(0).toUpperCase() + plain.slice(1).toLowerCase() : plain;
}

/**
 * The promoters that a line of text names, without amounts; none for a clean surface.
 * @example readPromoters('Cs 2 wt%, barium') // ['Ba', 'Cs']
 */
export function readPromoters(text: string | undefined): string[] {
  const words = (text ?? '').match(/\p{L}[\p{L}\p{N}]*/gu) ?? [];
  return [...new Set(words.filter((word) => !besides.has(word.toLowerCase())).map(promoterWord))].sort().slice(0, 20);
}
