/** What species are called, so that lists are found by names: the words that searches know, in short. */
const speciesNames: Readonly<Record<string, string>> = {
  N2: 'nitrogen, dinitrogen', N: 'atomic nitrogen, nitride', H2: 'hydrogen, dihydrogen', H: 'atomic hydrogen, hydride', O2: 'oxygen, dioxygen', O: 'atomic oxygen, oxide',
  C: 'atomic carbon, carbide', NH3: 'ammonia', NH2: 'amino, amide', NH: 'imido, imide', N2H4: 'hydrazine', H2O: 'water', OH: 'hydroxyl', CO: 'carbon monoxide',
  CO2: 'carbon dioxide', CH4: 'methane', CH3: 'methyl', CH2: 'methylene', CH: 'methylidyne', HCO: 'formyl', CH3OH: 'methanol', C2H4: 'ethylene, ethene',
  C2H2: 'acetylene, ethyne', C2H6: 'ethane', NO: 'nitric oxide', N2O: 'nitrous oxide', NO2: 'nitrogen dioxide', S: 'atomic sulfur', H2S: 'hydrogen sulfide',
};

/** The names of a species, or nothing when we have none for it. */
export function namesOfSpecies(formula: string): string {
  return speciesNames[formula] ?? '';
}

/** The formulas of the species in an equation, without sites, counts, phases and isotopes. */
export function speciesOf(equation: string): string[] {
  const terms = equation.split(/<?=>|<?->/).flatMap((side) => side.split(' + '));
  const formulas = terms.map((term) => term.trim().replace(/^\d+(?:\.\d+)?\s*/, '').replace(/\*.*$/, '').replace(/\((?:g|gas)\)$/, '').replace(/\[\d+([A-Z][a-z]?)\]/g, '$1').replace(/D(?![a-z])/g, 'H'));
  return [...new Set(formulas.filter(Boolean))];
}
