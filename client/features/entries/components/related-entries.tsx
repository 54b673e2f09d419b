import { Link } from 'react-router-dom';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import type { Bound } from '#shared/domain/kinds.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, setNumber } from '#client/lib/numbers.ts';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Aligned, mostDecimals } from '#client/ui/value.tsx';

type Related = EntryDetail['sameStepAndSurface'][number];

const decimals: Readonly<Record<EnergyUnit, number>> = { 'kJ/mol': 0, 'kcal/mol': 1, 'eV': 2 };

const boundSigns: readonly [RegExp, Bound][] = [[/^(<=|≤|⩽)/, '≤'], [/^(>=|≥|⩾)/, '≥'], [/^</, '<'], [/^>/, '>'], [/^(~|≈|ca\.|about)/, '≈']];

/** The bound that the print of an energy begins with; a limit must not be taken for a value. */
function printedBound(text: string): Bound {
  return boundSigns.find(([pattern]) => pattern.test(text.trim()))?.[1] ?? '=';
}

/** Other accepted entries, each with its drawn barrier on one scale. */
export function RelatedEntries({ title, entries, unit, none }: { title: string; entries: readonly Related[]; unit: EnergyUnit; none: string }) {
  const max = Math.max(1e-9, ...entries.map(({ energyKJPerMol }) => energyIn(unit, energyKJPerMol ?? 0)));
  const numbers = entries.map(({ energyKJPerMol }) => (energyKJPerMol === null ? null : setNumber(energyIn(unit, energyKJPerMol), { decimals: decimals[unit] })));
  const places = mostDecimals(numbers);
  return (
    <section>
      <h2 className="pb-2">{title}</h2>
      {entries.length === 0 ? <p className="text-second">{none}</p> : (
        <div className="table-frame">
          <table className="data-table">
            <thead>
              <tr>
                <th scope="col"><span className="sr-only">Drawn barrier</span></th>
                <th scope="col" className="numeric">E<sub>a</sub><span className="table-unit">{unit}</span></th>
                <th scope="col">as printed</th>
                <th scope="col">Source</th>
              </tr>
            </thead>
            <tbody>
              {entries.map((one, index) => {
                const number = numbers[index] ?? null;
                return (
                  <tr key={one.accession}>
                    <td>
                      {one.energyKJPerMol !== null && <SillGlyph energy={energyIn(unit, one.energyKJPerMol)} bound={printedBound(one.asPrinted)} computed={one.computed} max={max} unit={unit} />}
                    </td>
                    <td className="numeric">{number ? <Aligned number={number} bound={printedBound(one.asPrinted)} decimals={places} strong /> : <span className="text-second">none</span>}</td>
                    <td className="printed">{one.asPrinted}</td>
                    <th scope="row"><Link to={`/entries/${one.accession}`}>{one.label}</Link>{one.computed && <>{' '}<Tag>computed</Tag></>}</th>
                  </tr>
                );
              })}
            </tbody>
          </table>
        </div>
      )}
    </section>
  );
}
