import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertEnergy } from '#shared/kinetics/energy.ts';
import { spellingCollisions, unitTokens } from '#shared/kinetics/unit-tokens.ts';
import { dimensionText, findUnit, listUnits, sameDimension, scaleBetween, siUnit, unitKinds } from '#shared/kinetics/units.ts';

describe('units', () => {
  it.each([
    [['s-1', 's^-1', '1/s', 's⁻¹', 'sec-1', 'per second', 's^{-1}', 's<sup>-1</sup>', 's**-1', 's−1', 'site-1 s-1', 's^-1 (per site)'], 's-1'],
    [['cm3 molecule-1 s-1', 'cm^3 molecule^-1 s^-1', 'cm³ molecule⁻¹ s⁻¹', 'cm3/(molecule s)', 'cm3/molecule/s', 'cm3/molecule s', 'cm3·molecule-1·s-1', 'cm^{3} molec.^{-1} s^{-1}', 'cm3 molecules-1 s-1'], 'cm3 molecule-1 s-1'],
    [['L mol-1 s-1', 'L/mol/s', 'L/(mol·s)', 'l mol^-1 s^-1', 'L/mol s-1', 'liter mol-1 sec-1'], 'L mol-1 s-1'],
    [['M-1 s-1', 'M^-1 s^-1', '1/(M s)', 'M⁻¹ s⁻¹', 'M⁻¹s⁻¹'], 'M-1 s-1'],
    [['Torr-1 s-1', '1/(Torr s)', 'torr^-1 s^-1'], 'Torr-1 s-1'],
    [['ML-1 s-1', 'ML^-1 s^-1', '1/ML/s'], 'ML-1 s-1'],
    [['kcal/mol', 'kcal mol-1', 'kcal·mol⁻¹', 'kcal.mol-1', 'Kcal/mole', 'kcal per mol', '\\mathrm{kcal\\,mol^{-1}}', 'kcal mol−1'], 'kcal/mol'],
    [['kJ/mol', 'kJ mol-1', 'KJ/mol', 'kJ mol^{-1}'], 'kJ/mol'],
    [['J mol-1 K-1', 'J/(mol K)', 'J/mol K', 'J/mol/K', 'J K-1 mol-1'], 'J mol-1 K-1'],
    [['mol g-1 bar-0.3 s-1', 'mol g-1 s-1 bar-0.3', 'mol gcat-1 s-1 bar^-0.3', 'mol/(g s bar^0.3)', 'mol g_{cat}^-1 s-1 bar^{-0.3}'], 'mol g-1 bar-0.3 s-1'],
    [['Pa-0.5 s-1', 'Pa^(-1/2) s-1', 'Pa^{-0.5} s^{-1}'], 'Pa-0.5 s-1'],
    [['eV', 'ev'], 'eV'],
    [['cm-1', 'cm^-1', 'cm⁻¹', '1/cm'], 'cm-1'],
    [['', '-', '1', 'dimensionless'], '1'],
    [['Btu_IT/lbmol', 'Btu(IT)/lb-mol', 'BTU_IT/lbmole'], 'Btu_IT/lbmol'],
    [['mmHg-1 s-1', 'mm Hg^-1 s^-1'], 'mmHg-1 s-1'],
    [['eu', 'e.u.'], 'eu'],
    [['hartree', 'Ha', 'a.u.'], 'hartree'],
    [['molecule site-1 s-1', 'molecules per site per s'], 'molecule site-1 s-1'],
    [['m s-1', 'm/s'], 'm s-1'],
    // Exponents that lost their raised place in copying, and the hyphen as a sign of multiplication.
    [['kJ mol -1', 'kJ mol −1', 'kJ·mol –1', 'kJ/mol.'], 'kJ/mol'],
    [['cm 3 molecule -1 s -1', 'cm3/molecule-s', 'cm3 molecule−1s−1'], 'cm3 molecule-1 s-1'],
    [['mol/cm2-s', 'mol/cm2·sec', 'mol cm -2 s -1', 'gmol/(cm2 sec)'], 'mol cm-2 s-1'],
    [['/s', '/ sec', '/second', 'per Second'], 's-1'],
    // Fractions of every kind.
    [['bar-0.3', 'bar^-0.3', 'bar^(-0.3)', 'bar^{-0.3}', 'bar⁻⁰·³', 'bar⁻⁰˙³'], 'bar-0.3'],
    [['Pa-0.5', 'Pa^-1/2', 'Pa-1/2', 'Pa^{-1/2}', 'Pa⁻¹⁄²', 'Pa⁻¹ᐟ²', 'Pa^-½', 'Pa−½'], 'Pa-0.5'],
    [['Pa0.5', 'Pa½', 'Pa^½', 'Pa^1/2'], 'Pa0.5'],
    [['Torr-0.5 s-1', 'Torr^-1/2 s^-1', '1/(Torr½ s)'], 'Torr-0.5 s-1'],
    // Energies.
    [['mhartree', 'mHa', 'mEh', 'millihartree'], 'mhartree'],
    [['mrydberg', 'mRy', 'mRyd'], 'mrydberg'],
    [['eV/atom', 'eV atom-1', 'eV per atom', 'eV/at.'], 'eV/atom'],
    [['cal/mol', 'cal/g-mol', 'cal/g mol', 'cals/gmole'], 'cal/mol'],
    [['kcal_IT/mol', 'kcalIT mol-1'], 'kcal_IT/mol'],
    [['cm-1', 'wavenumbers', 'wavenumber', 'kayser'], 'cm-1'],
    [['erg/molecule', 'ergs per molecule'], 'erg/molecule'],
    [['K', 'kelvin', '°K', 'deg K', 'degK'], 'K'],
    [['cal mol-1 K-1', 'cal/(mol deg)', 'cal/deg mol', 'cal mol-1 deg-1', 'cal/mol-K'], 'cal mol-1 K-1'],
    // Pressures, times, amounts, concentrations.
    [['hPa', 'hectopascal'], 'hPa'],
    [['mbar', 'mBar', 'millibar'], 'mbar'],
    [['ubar', 'μbar', 'µbar'], 'ubar'],
    [['atm', 'Atm', 'ATM', 'atm.', 'atmospheres'], 'atm'],
    [['mmHg', 'mm Hg', 'mm-Hg', 'mm_Hg', 'mm. Hg', 'mmhg'], 'mmHg'],
    [['psi', 'psia', 'PSI'], 'psi'],
    [['dyn cm-2', 'dyne/cm2'], 'dyn cm-2'],
    [['Torr s', 'torr·s', 'Torr-s', 'torr sec'], 'Torr s'],
    [['langmuir', 'Langmuirs'], 'langmuir'],
    [['us', 'μs', 'µs', 'usec', 'microseconds'], 'us'],
    [['min', 'mins', 'minutes', 'min.'], 'min'],
    [['Hz', 'hertz'], 'Hz'],
    [['THz', 'terahertz'], 'THz'],
    [['umol g-1 s-1', 'μmol g−1 s−1', 'µmol/(g s)', 'micromol gcat-1 s-1', 'umol/g/s'], 'umol g-1 s-1'],
    [['atom cm-2', 'at/cm2', 'at. cm-2', 'atoms per cm2'], 'atom cm-2'],
    [['uM', 'μM', 'micromolar'], 'uM'],
    [['mol L-1', 'mol/L', 'mol l-1', 'mol/liter'], 'mol L-1'],
    [['ML s-1', 'ML/s', 'monolayers per second'], 'ML s-1'],
  ])('reads %j one way', (spellings, symbol) => {
    for (const spelling of spellings) expect(findUnit(spelling)?.symbol, spelling).toBe(symbol);
  });

  it.each(['foo', 's-1)', '(s', 's-', 'mol/s-1', '//s', '/', '/ s-1', 's 7', 's 2.5', 'mol%', 'at. %', 'psig', 'Mg', 'm·in', 'm in', 'in', 'KM', 'S-1', 'bar^-n', 'eV/N2', '°C', 'kJ/mol-N2', 'M i n', 'Pa^-1/0', 's/', 's//s', 's^', 's^x', 's^99', '2 s', '1 1', '10 s-1', 's^{-1', 'kj/Mol2x', '()', '((((((((s))))))))', 'x'.repeat(200), 'btu/lbmol', '1/'])('does not take %j for a unit', (text) => {
    expect(findUnit(text)).toBeNull();
  });

  it('keeps capitals apart', () => {
    const size = (text: string) => [findUnit(text)?.dimension, findUnit(text)?.toSi];
    expect(size('M')[1]).toBe(1000);
    expect(findUnit('m')?.dimension.length).toBe(1);
    expect(findUnit('ML')?.dimension.coverage).toBe(1);
    expect(findUnit('mL')?.dimension.length).toBe(3);
    expect(findUnit('min')?.toSi).toBe(60);
    expect(findUnit('h')?.toSi).toBe(3600);
    expect(findUnit('mPa')).toBeNull();
    expect(findUnit('MPa')?.toSi).toBe(1e6);
    expect(findUnit('K')?.dimension.temperature).toBe(1);
    expect(findUnit('k')).toBeNull();
    expect(spellingCollisions()).toEqual([]);
  });

  it('has no spelling that reads as two units', () => {
    expect(spellingCollisions()).toEqual([]);
    const metre = unitTokens[0] as (typeof unitTokens)[number];
    expect(spellingCollisions([metre, { ...metre, symbol: 'micrometre', spellings: ['m'] }])).toEqual(['m: m, micrometre']);
    const owner = new Map(unitTokens.flatMap((token) => [token.symbol, ...token.spellings].map((spelling) => [spelling, token] as const)));
    expect(owner.size).toBeGreaterThan(300);
    for (const [spelling, token] of owner) {
      // As it stands, with an exponent, and beside another factor, it is this unit and no other.
      const alone = findUnit(spelling);
      expect(alone?.symbol, spelling).toBe(token.symbol);
      expect(alone?.factors.map((factor) => [factor.token.symbol, factor.exponent]), spelling).toEqual([[token.symbol, 1]]);
      expect(findUnit(`${spelling}2`)?.symbol, spelling).toBe(`${token.symbol}2`);
      // Written together two units are never read as two: `min` is no metre inch, `ms` no metre second.
      for (let cut = 1; cut < spelling.length; cut += 1) {
        const [first, second] = [owner.get(spelling.slice(0, cut)), owner.get(spelling.slice(cut))];
        if (first && second && first !== second) expect(findUnit(`${first.symbol} ${second.symbol}`)?.symbol, spelling).not.toBe(token.symbol);
      }
    }
  });

  it('lets capitals alone tell two units apart only where trade usage does', () => {
    const byLower = new Map<string, Set<string>>();
    for (const token of unitTokens) {
      for (const spelling of [token.symbol, ...token.spellings]) {
        const lower = spelling.toLowerCase();
        byLower.set(lower, (byLower.get(lower) ?? new Set()).add(token.symbol));
      }
    }
    const apart = [...byLower].filter(([, symbols]) => symbols.size > 1).map(([, symbols]) => [...symbols].sort().join(' '));
    expect(apart.sort()).toEqual(['M m', 'ML mL', 'mM mm', 'nM nm', 'uM um']);
  });

  // Sizes: SI Brochure, 9th edition; NIST SP 811 (2008), appendix B.8.
  it.each([
    ['hPa', 100], ['mbar', 100], ['kbar', 1e8], ['ubar', 0.1], ['atm', 101325], ['Torr', 101325 / 760], ['mmHg', 133.322387415], ['psi', 6894.757293168361], ['dyn cm-2', 0.1],
    ['langmuir', 101325 / 760 / 1e6], ['week', 604800], ['THz', 1e12], ['GHz', 1e9], ['MHz', 1e6], ['kHz', 1e3], ['pmol', 1e-12], ['uM', 1e-3], ['nM', 1e-6], ['ug', 1e-9], ['ng', 1e-12], ['uL', 1e-9],
    ['pm', 1e-12], ['erg', 1e-7], ['cal_IT', 4.1868], ['kcal_IT', 4186.8], ['mrydberg', 4.359744722206e-18 / 2000], ['mhartree', 4.359744722206e-21], ['ppm', 1e-6], ['ppb', 1e-9],
    ['bar-0.3', 1e5 ** -0.3], ['mol g-1 s-1 bar-0.3', 1000 * 1e5 ** -0.3],
  ])('1 %s is %d in SI', (text, size) => {
    expect(Math.abs((findUnit(text)?.toSi ?? NaN) / size - 1)).toBeLessThan(1e-15 * 4);
  });

  it('reads the new energies as energies', () => {
    for (const [unit, kJ] of [['mHa', 2.6254996394798], ['mRy', 1.3127498197399], ['kcal_IT/mol', 4.1868], ['erg/molecule', 6.02214076e13], ['eV/atom', 96.48533212331]] as const) {
      expect(Math.abs(convertEnergy({ value: 1, from: unit, to: 'kJ/mol' }).value / kJ - 1), unit).toBeLessThan(1e-11);
    }
  });

  it('counts particles and sites', () => {
    expect(findUnit('cm3 molecule-1 s-1')).toMatchObject({ molecular: -1, perSite: false });
    expect(findUnit('molecule site-1 s-1')).toMatchObject({ toSi: 1, perSite: true });
    expect(findUnit('s-1 site-1')).toMatchObject({ toSi: 1, perSite: true, symbol: 's-1' });
    expect(findUnit('mol mol-1 s-1')?.symbol).toBe('s-1');
  });

  it('reads what it prints, and its size does not change', () => {
    const token = fc.constantFrom(...unitTokens.filter(({ symbol }) => symbol !== 'site'));
    const exponent = fc.constantFrom(-3, -2, -1, -0.5, 0.5, 1, 2, 3);
    fc.assert(
      fc.property(fc.uniqueArray(fc.record({ token, exponent }), { minLength: 1, maxLength: 4, selector: (item) => item.token.symbol }), (parts) => {
        const text = parts.map(({ token: part, exponent: power }) => `${part.symbol}^${power}`).join(' ');
        const unit = findUnit(text);
        if (unit === null) {
          // Only a size outside double range is no unit.
          const size = parts.reduce((sum, part) => sum + Math.abs(part.exponent * Math.log10(part.token.numerator / part.token.denominator)), 0);
          expect(size).toBeGreaterThan(290);
          return;
        }
        const again = findUnit(unit.symbol);
        expect(again?.symbol).toBe(unit.symbol);
        expect(Math.abs((again?.toSi ?? 0) / unit.toSi - 1)).toBeLessThan(1e-14);
        expect(again?.dimension).toEqual(unit.dimension);
      }),
      { numRuns: 500 },
    );
  });

  it('never throws and never hangs', () => {
    const piece = fc.constantFrom('s', 'cm', 'mol', '-1', '^', '/', '(', ')', ' ', '{', '}', '·', '⁻¹', 'per', '.', '*', '1', '%', '\\', 'x');
    fc.assert(fc.property(fc.oneof(fc.string({ maxLength: 200 }), fc.array(piece, { maxLength: 60 }).map((pieces) => pieces.join(''))), (text) => {
      const unit = findUnit(text);
      expect(unit === null || unit.toSi > 0).toBe(true);
    }), { numRuns: 1500 });
  });

  it('stays correct when its memory is emptied', () => {
    for (let i = 0; i < 2100; i += 1) findUnit(`s-1 m${i}`);
    expect(findUnit('s-1')?.symbol).toBe('s-1');
  });

  it('lists units for every picker', () => {
    for (const kind of unitKinds) {
      const units = listUnits(kind);
      expect(units.length).toBeGreaterThan(0);
      for (const unit of units) expect(findUnit(unit.symbol)?.symbol).toBe(unit.symbol);
    }
    expect(listUnits('energy').map(({ symbol }) => symbol)).not.toContain('Btu_IT/lbmol');
  });

  it('scales and compares', () => {
    const [cm, m] = [findUnit('cm2 s-1'), findUnit('m2 s-1')];
    if (!cm || !m) throw new Error('units are registered');
    expect(sameDimension(cm, m)).toBe(true);
    expect(scaleBetween(1, cm, m)).toBe(1e-4);
    expect(scaleBetween(3, m, m)).toBe(3);
    expect(scaleBetween(0, cm, m)).toBe(0);
    expect(siUnit({ length: 3, amount: -1, time: -1 }).symbol).toBe('m3 mol-1 s-1');
    expect(dimensionText(m.dimension)).toBe('length2 time-1');
    expect(dimensionText(siUnit({}).dimension)).toBe('dimensionless');
  });
});
