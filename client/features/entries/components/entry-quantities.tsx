import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { DerivationLine, Quantity } from '#shared/contracts/quantities.ts';
import { provenanceWords } from '#shared/domain/kinds.ts';
import { R } from '#shared/kinetics/constants.ts';
import { Derivation } from '#client/ui/derivation.tsx';
import { PrintedConverted } from '#client/ui/printed-converted.tsx';
import { QuantityValue, quantityWords } from '#client/ui/quantity-value.tsx';
import { Sign } from '#client/ui/signs.tsx';
import { Value } from '#client/ui/value.tsx';
import { boundText, orderedQuantities, uncertaintyText } from '../quantity-words.ts';
import { asPrinted, shown } from '../row-figures.ts';

/** As printed and converted: the primary quantity large, the others in a line each. */
export function EntryQuantities({ entry, unit }: { entry: Entry; unit: EnergyUnit }) {
  const [primary, ...others] = orderedQuantities(entry);
  if (!primary) return <p className="text-second">Nothing is given as printed yet.</p>;
  return (
    <div className="flex flex-col gap-6">
      <PrintedConverted
        printed={asPrinted(primary)}
        locator={entry.locator}
        converted={<Converted quantity={primary} unit={unit} large />}
        meaning={meaningOf(entry, primary)}
        state={primary.value === null && primary.low === null && primary.high === null ? 'doubt' : 'result'}
      />
      {others.length > 0 && (
        <dl className="border-t border-hairline">
          {others.map((quantity, index) => (
            <div key={index} className="grid gap-x-5 gap-y-1 border-b border-hairline py-2.5 mid:grid-cols-[10.5rem_minmax(0,1fr)_1.5rem_minmax(0,1.2fr)]">
              <dt className="text-second">{quantityWords(quantity)}</dt>
              <dd><samp>{asPrinted(quantity)}</samp></dd>
              <dd className="text-second max-mid:hidden"><Sign of="->" /></dd>
              <dd>
                <Converted quantity={quantity} unit={unit} />
                <span className="block text-fine text-second">{[boundText(quantity), uncertaintyText(quantity)].filter(Boolean).join('; ')}</span>
              </dd>
            </div>
          ))}
        </dl>
      )}
    </div>
  );
}

/** The converted value, and per site where it could be brought there; what is missing otherwise. */
export function Converted({ quantity, unit, large = false }: { quantity: Quantity; unit: EnergyUnit; large?: boolean }) {
  const { siteValue, siteUnit, missing, significantDigits } = quantity;
  return (
    <>
      <QuantityValue quantity={asMeant(quantity, unit)} energyUnit={unit} large={large} />
      {siteValue != null && siteUnit && siteUnit !== quantity.unit && (
        <span className="block text-second">per site: <Value value={siteValue} unit={siteUnit} significantDigits={significantDigits} /></span>
      )}
      {missing && missing.length > 0 && <span className="block text-ochre">{`Not known: ${missing.join(', ')}.`}</span>}
    </>
  );
}

/** A value shown in the unit it is printed in has no digit to guard: "137 kJ/mol" stays 137. */
function asMeant(quantity: Quantity, unit: EnergyUnit): Quantity {
  const { significantDigits } = quantity;
  return significantDigits !== null && shown(quantity, unit).guard === 0 && quantity.unit === 'kJ/mol' ? { ...quantity, significantDigits: Math.max(1, significantDigits - 1) } : quantity;
}

function meaningOf(entry: Entry, quantity: Quantity): string {
  const parts = [quantityWords(quantity), entry.provenance ? provenanceWords[entry.provenance] : null, entry.scope, boundText(quantity)];
  return `${parts.filter(Boolean).join(', ')}; ${uncertaintyText(quantity)}`;
}

/** Figures longer than eight digits, cut to eight: enough to follow the way; exports have them in full. */
function readable(lines: readonly DerivationLine[]): DerivationLine[] {
  const cut = (text: string) => text.replace(/(?<![\w.])\d+(?:\.\d+)?(?:e[+-]?\d+)?/g, (figure) => (figure.replace(/e.*$|\D/g, '').length > 8 ? short(Number(figure)) : figure));
  return lines.map((line) => ({ ...line, from: cut(line.from), to: cut(line.to) }));
}

function short(value: number): string {
  const eight = Number(value.toPrecision(8));
  return eight >= 1e7 || eight < 1e-4 ? eight.toExponential().replace('e+', 'e') : String(eight);
}

/** How k at the temperature of interest follows from the converted parameters. */
function rateLines({ quantities, validRange }: Entry, { value, unit, temperatureK, extrapolated }: NonNullable<Entry['kAtT']>): DerivationLine[] {
  const modified = quantities.some(({ symbol }) => symbol === 'exponent');
  return [{
    operation: modified ? 'k = A (T/T0)^n exp(\u2212E/RT)' : 'k = A exp(\u2212E/RT)',
    from: '',
    to: `${value.toExponential(3).replace('e+', 'e')} ${unit}`,
    constant: `R = ${R} J mol-1 K-1`,
    reference: 'IUPAC glossary of terms used in chemical kinetics',
    ...(extrapolated ? { assumption: validRange ? `the parameters hold at ${temperatureK} K, outside the valid range` : `the parameters hold at ${temperatureK} K; the source states no valid range` } : {}),
  }];
}

/** The way from as printed to converted, for every quantity. */
export function EntryDerivations({ entry }: { entry: Entry }) {
  const quantities = orderedQuantities(entry);
  return (
    <section>
      <h2 className="pb-2">The derivation</h2>
      {quantities.map((quantity, index) => (
        <div key={index} className={index > 0 ? 'pt-4' : ''}>
          {quantities.length > 1 && <h3 className="pb-1 text-second">{quantityWords(quantity).replace(/^./, (first) => first.toUpperCase())}</h3>}
          <Derivation lines={readable(quantity.derivation)} />
        </div>
      ))}
      {entry.kAtT && (
        <div className="pt-4">
          <h3 className="pb-1 text-second">{`Rate constant at ${entry.kAtT.temperatureK} K`}</h3>
          <Derivation lines={rateLines(entry, entry.kAtT)} />
        </div>
      )}
      {entry.conversion && (
        <p className="pt-2 text-fine text-second">{`Converted with core ${entry.conversion.coreVersion}, constants ${entry.conversion.constantsVersion}.`}</p>
      )}
    </section>
  );
}
