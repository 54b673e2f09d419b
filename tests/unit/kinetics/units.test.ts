import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
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
  ])('reads %j one way', (spellings, symbol) => {
    for (const spelling of spellings) expect(findUnit(spelling)?.symbol, spelling).toBe(symbol);
  });

  it.each(['foo', 's-1)', '(s', 's-', 'mol/s-1', '/s', 's/', 's//s', 's^', 's^x', 's^99', '2 s', '1 1', '10 s-1', 's^{-1', 'kj/Mol2x', '()', '((((((((s))))))))', 'x'.repeat(200), 'btu/lbmol', '1/'])('does not take %j for a unit', (text) => {
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
