/** Kinds of site as people write them, by the spelling kept. */
const spellings: Record<string, string[]> = {
  'fcc': ['fcc', 'fcc-hollow', 'hollow-fcc'],
  'hcp': ['hcp', 'hcp-hollow', 'hollow-hcp'],
  'top': ['top', 'atop', 'ontop', 'on-top', 'on top'],
  'bridge': ['bridge', 'br', 'brg', 'bri'],
  'hollow': ['hollow', 'hol', 'hl'],
  'threefold': ['threefold', '3fold', '3-fold', '3f', 'three-fold'],
  'fourfold': ['fourfold', '4fold', '4-fold', '4f', 'four-fold'],
  'long-bridge': ['long-bridge', 'longbridge', 'lb', 'long'],
  'short-bridge': ['short-bridge', 'shortbridge', 'sb', 'short'],
  'step': ['step', 'steps', 'stepped'],
  'step-edge': ['step-edge', 'stepedge', 'edge-step'],
  'edge': ['edge'],
  'kink': ['kink'],
  'terrace': ['terrace', 'ter', 'terr'],
  'corner': ['corner'],
  'defect': ['defect', 'vacancy'],
  'subsurface': ['subsurface', 'sub', 'abs', 'absorbed', 'bulk'],
  'interface': ['interface', 'int', 'perimeter'],
  'support': ['support', 'sup'],
  'precursor': ['precursor', 'phys', 'physisorbed'],
  'B5': ['B5'],
  'B6': ['B6'],
  'F4': ['F4'],
  'upper': ['upper'],
  'lower': ['lower'],
};

const byName = new Map(Object.entries(spellings).flatMap(([kept, names]) => names.map((name) => [name.toLowerCase(), kept] as const)));

const escaped = [...byName.keys()].sort((a, b) => b.length - a.length).map((name) => name.replace('-', '-?'));

/** A kind of site named by a word that nothing else is called by; for a pattern that ignores case. */
export const siteWordPattern = escaped.join('|');

/** Words that say a species is adsorbed and nothing about where. */
export const adsorbedWords = ['a', 'ad', 'ads', 'adsorbed', 'surf', 'surface', 'chem', 'chemisorbed', 'chemi'];

/** Words that say a species is a gas. */
export const gasWords = ['g', 'gas', 'gas phase', 'gas-phase', 'vap', 'vapour', 'vapor'];

/**
 * One spelling of a kind of site: `atop` and `top` are `top`; an unknown name is kept; a digit becomes `site2`, since `*2` could mean two sites.
 *
 * @example siteName('4-fold') // 'fourfold'
 */
export function siteName(typed: string): string {
  const known = byName.get(typed.toLowerCase().replace(/\s+/g, '-'));
  if (known) return known;
  return /^\d$/.test(typed) ? `site${typed}` : typed.replace(/\s+/g, '-');
}
