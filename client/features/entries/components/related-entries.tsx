import { Link } from 'react-router-dom';
import type { RelatedEntry } from '#shared/contracts/entries.ts';
import { energyTypeWords, type EnergyType } from '#shared/domain/kinds.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, setNumber } from '#client/lib/numbers.ts';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Aligned, mostDecimals } from '#client/ui/value.tsx';

const decimals: Readonly<Record<EnergyUnit, number>> = { 'kJ/mol': 0, 'kcal/mol': 1, 'eV': 2 };

/** Other accepted entries, each with its drawn barrier on one scale; those of its kind first, and what sets the others apart said beside them. */
export function RelatedEntries({ label, entries: given, ownType, unit, none }: {
  label: string; entries: readonly RelatedEntry[]; ownType: EnergyType | null; unit: EnergyUnit; none: string;
}) {
  const entries = [...given.filter(({ alike }) => alike), ...given.filter(({ alike }) => !alike)];
  if (entries.length === 0) return <p className="text-second">{none}</p>;
  const max = Math.max(1e-9, ...entries.map(({ energyKJPerMol }) => energyIn(unit, energyKJPerMol ?? 0)));
  const numbers = entries.map(({ energyKJPerMol }) => (energyKJPerMol === null ? null : setNumber(energyIn(unit, energyKJPerMol), { decimals: decimals[unit] })));
  const places = mostDecimals(numbers);
  return (
    <div className="table-frame" role="group" aria-label={label} tabIndex={0}>
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
            const bound = one.bound ?? '=';
            return (
              <tr key={one.accession}>
                <td>
                  {one.energyKJPerMol !== null && <SillGlyph energy={energyIn(unit, one.energyKJPerMol)} {...(one.uEnergyKJPerMol === null ? {} : { u: energyIn(unit, one.uEnergyKJPerMol) })} bound={bound} computed={one.computed} max={max} unit={unit} />}
                </td>
                <td className="numeric">{number ? <Aligned number={number} bound={bound} decimals={places} strong /> : <span className="text-second">none</span>}</td>
                <td className="printed">{one.asPrinted}</td>
                <th scope="row"><Link to={`/entries/${one.accession}`}>{one.label}</Link>{tagsOf(one, ownType).map((tag) => <span key={tag}>{' '}<Tag>{tag}</Tag></span>)}</th>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

/** Words in frames: how the value was found, and where it is another quantity than the one shown, which. */
function tagsOf({ computed, scope, energyType, promoters }: RelatedEntry, ownType: EnergyType | null): string[] {
  return [
    ...(computed ? ['computed'] : []),
    ...(scope !== null && scope !== 'elementary' ? [scope] : []),
    ...(energyType && energyType !== ownType ? [energyTypeWords[energyType]] : []),
    ...(promoters.length > 0 ? [`promoted by ${promoters.join(', ')}`] : []),
  ];
}
