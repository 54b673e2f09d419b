import { plainFormula } from './surface-composition.ts';

/** Names of supports by the formula that papers have (common practice). */
const formulas: Readonly<Record<string, string>> = {
  'alumina': 'Al2O3', 'aluminium oxide': 'Al2O3', 'aluminum oxide': 'Al2O3', 'silica': 'SiO2', 'silicon dioxide': 'SiO2', 'silicon oxide': 'SiO2', 'magnesia': 'MgO', 'magnesium oxide': 'MgO', 'titania': 'TiO2', 'titanium dioxide': 'TiO2',
  'zirconia': 'ZrO2', 'zirconium dioxide': 'ZrO2', 'ceria': 'CeO2', 'cerium dioxide': 'CeO2', 'cerium oxide': 'CeO2', 'lanthana': 'La2O3', 'lanthanum oxide': 'La2O3', 'barium oxide': 'BaO', 'calcium oxide': 'CaO', 'boron nitride': 'BN', 'h-bn': 'BN',
  'carbon': 'C', 'carbon nanotubes': 'CNT', 'carbon nanotube': 'CNT', 'cnts': 'CNT', 'mwcnt': 'CNT', 'magnesium aluminate': 'MgAl2O4', 'spinel': 'MgAl2O4', 'niobia': 'Nb2O5', 'yttria': 'Y2O3', 'hydroxyapatite': 'HAP',
};

const greek: readonly [RegExp, string][] = [[/^(?:gamma|γ)[-\s]?/i, 'γ-'], [/^(?:alpha|α)[-\s]?/i, 'α-'], [/^(?:theta|θ)[-\s]?/i, 'θ-'], [/^(?:eta|η)[-\s]?/i, 'η-'], [/^(?:delta|δ)[-\s]?/i, 'δ-']];

/** One name for a support: `alumina` and `Al₂O₃` are `Al2O3`, `gamma-alumina` is `γ-Al2O3`; what is not known stays as typed. */
export function supportName(typed: string): string {
  const plain = plainFormula(typed);
  for (const [prefix, letter] of greek) {
    const match = prefix.exec(plain);
    if (match && (/^[A-Z]/.test(plain.slice(match[0].length)) || formulas[plain.slice(match[0].length).toLowerCase()])) return letter + supportName(plain.slice(match[0].length));
  }
  return formulas[plain.toLowerCase()] ?? plain;
}
