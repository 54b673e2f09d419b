const symbols =
  'H He Li Be B C N O F Ne Na Mg Al Si P S Cl Ar K Ca Sc Ti V Cr Mn Fe Co Ni Cu Zn Ga Ge As Se Br Kr Rb Sr Y Zr Nb Mo Tc Ru Rh Pd Ag Cd In Sn Sb Te I Xe ' +
  'Cs Ba La Ce Pr Nd Pm Sm Eu Gd Tb Dy Ho Er Tm Yb Lu Hf Ta W Re Os Ir Pt Au Hg Tl Pb Bi Po At Rn Fr Ra Ac Th Pa U Np Pu Am Cm Bk Cf Es Fm Md No Lr';

const elements = new Set(symbols.split(' '));

/** True for a symbol of the periodic table up to lawrencium; what comes after it is no matter of chemistry on surfaces (COg is CO gas). */
export function isElement(symbol: string): boolean {
  return elements.has(symbol);
}

/** Order of elements in the formula of a binary compound. Source: IUPAC Red Book 2005, table VI (excerpt). */
export const binaryOrder = ['B', 'Si', 'C', 'Sb', 'As', 'P', 'N', 'H', 'Te', 'Se', 'S', 'At', 'I', 'Br', 'Cl', 'O', 'F'] as const;
