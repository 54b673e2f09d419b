import { R } from '#shared/kinetics/constants.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { energyIn } from '#client/lib/numbers.ts';
import { ArrheniusPlot } from '#client/ui/arrhenius-plot.tsx';
import { Derivation } from '#client/ui/derivation.tsx';
import { Facts } from '#client/ui/facts.tsx';
import { PrintedConverted } from '#client/ui/printed-converted.tsx';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Value } from '#client/ui/value.tsx';

const lines = [
  { operation: 'Read the printed value; "±" is two standard deviations', from: '44.5 ± 1.4 kcal/mol', to: '44.5, U = 1.4', reference: 'as printed in the source' },
  { operation: 'Standard uncertainty, U / 2', from: '1.4 kcal/mol', to: 'u = 0.70 kcal/mol', reference: 'JCGM 100:2008 (GUM), 6.2' },
  { operation: 'Multiply by the thermochemical calorie', from: '44.5 kcal/mol', to: '186.188 kJ/mol', constant: '4.184 J exactly', reference: 'BIPM SI Brochure, 9th edition' },
  { operation: 'Rate per area divided by the site density', from: '1e19 m-2 s-1', to: '0.64 s-1', assumption: 'site density 1.58e19 m-2, outermost atoms of Ru(0001) with a = 2.706 Å', reference: 'site balance' },
];

/** The pieces of an entry's page. */
export function GalleryEntry() {
  const { unit, temperatureK } = useInstrument();
  const lnK = (energy: number, lnA: number) => (t: number) => lnA - (energy * 1000) / (R * t);
  return (
    <section className="section-line grid gap-10 wide:grid-cols-[minmax(0,2fr)_minmax(0,1fr)]">
      <div className="flex flex-col gap-6">
        <PrintedConverted
          printed="44.5 ± 1.4 kcal/mol" locator="Table 2, page 113"
          converted={<Value large value={energyIn(unit, 186.188)} u={energyIn(unit, 2.93)} unit={unit} />}
          meaning="activation energy, measured, elementary; ± is one standard uncertainty"
        />
        <PrintedConverted printed="1.3 x 10^-3 Torr-1 s-1" converted={<strong>Not converted</strong>} meaning="The source does not say what the rate counts." state="doubt" />
        <p className="flex flex-wrap gap-6">
          <Value value={1.28e13} u={0.92} uScale="ln" unit="s-1" scientific significantDigits={2} />
          <Value value={null} low={152} bound="≥" unit="kJ/mol" significantDigits={2} />
          <Value value={null} low={24} high={27} bound="range" unit="kcal/mol" significantDigits={1} />
          <Value value={25} bound="≈" unit="kJ/mol" significantDigits={1} />
          <Value value={3.4e-8} unit="cm2 molecule-1 s-1" significantDigits={2} />
          <Value value={null} />
        </p>
        <div><h2>The derivation</h2><Derivation lines={lines} /></div>
        <div>
          <h2>Conditions and surface</h2>
          <Facts facts={[{ name: 'Surface', value: 'Ru, hcp, (0001), single crystal, terraces' }, { name: 'Coverage', value: null }, { name: 'Checks', value: <Tag kind="doubt">valid range ends below 700 K</Tag> }]} />
        </div>
        <div className="flex flex-wrap items-end gap-4">
          <SillGlyph scale={3} energy={120} u={12} reactionEnergy={40} computed={false} max={130} unit="kJ/mol" />
          <SillGlyph scale={3} energy={80} reactionEnergy={20} computed max={130} unit="kJ/mol" />
          <SillGlyph scale={3} energy={null} low={90} bound="≥" computed={false} max={130} unit="kJ/mol" />
          <SillGlyph scale={3} energy={null} high={90} bound="<" computed={false} max={130} unit="kJ/mol" />
          <SillGlyph scale={3} energy={null} low={70} high={100} bound="range" computed={false} max={130} unit="kJ/mol" />
        </div>
      </div>
      <div className="flex flex-col gap-8">
        <div>
          <h2>Rate against temperature</h2>
          <ArrheniusPlot temperatureK={temperatureK} unit="s-1" lines={[{ id: 'a', label: 'Vantongeren 1994', lnK: lnK(186, Math.log(1e13)), uLnK: () => 0.6, range: { min: 430, max: 620 } }]} />
        </div>
        <div>
          <h2>Several</h2>
          <ArrheniusPlot
            temperatureK={temperatureK} unit="s-1" lines={[
              { id: 'a', label: 'Ru(0001), Vantongeren 1994', lnK: lnK(186, Math.log(1e13)), uLnK: () => 0.6, range: { min: 430, max: 620 } },
              { id: 'b', label: 'Ru(0001), step edge, Haldane-Roux 2003', lnK: lnK(158, Math.log(2e13)), range: { min: 400, max: 720 } },
              { id: 'c', label: 'Fe(111), Petrescu 1988', lnK: lnK(140, Math.log(1e12)), range: null },
            ]}
          />
        </div>
      </div>
    </section>
  );
}
