import { useState } from 'react';
import { R } from '#shared/kinetics/constants.ts';
import { csvText } from '#client/lib/csv-text.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { ArrheniusPlot } from '#client/ui/arrhenius-plot.tsx';
import { CompensationPlot } from '#client/ui/compensation-plot.tsx';
import { EnergyProfile } from '#client/ui/energy-profile.tsx';
import { FitPlot } from '#client/ui/fit-plot.tsx';
import { IntervalPlot } from '#client/ui/interval-plot.tsx';
import { KiePlot } from '#client/ui/kie-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { fitPoints, intervalRows, leftOneOut, longPathway, pathways } from './plot-values.ts';

const line = (energy: number, lnA: number) => (t: number) => lnA - (energy * 1000) / (R * t);

/** The plots, with invented values. */
export function GalleryPlots() {
  const { temperatureK } = useInstrument();
  const [out, setOut] = useState(new Set([7]));
  const points = fitPoints.map((point, index) => ({ ...point, excluded: out.has(index) }));
  const toggle = (index: number) => setOut((before) => {
    const next = new Set(before);
    if (!next.delete(index)) next.add(index);
    return next;
  });
  return (
    <section className="section-line grid grid-cols-[minmax(0,1fr)] gap-12 wide:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
      <PlotFrame title="Fit of k against T" caption="Invented values." csv={() => csvText(['temperature_K', 'ln_k'], fitPoints.map((point) => [point.temperatureK, point.lnK]))}>
        <FitPlot points={points} unit="s-1" onToggle={toggle} line={{ lnPreExponential: 29.93, energyKJPerMol: 132, uLnPreExponential: 0.9, uEnergyKJPerMol: 3.6, correlation: 0.995, coverageFactor: 2.571, bandLabel: '95 % confidence of the line' }} />
      </PlotFrame>
      <PlotFrame title="Fit without a correlation">
        <FitPlot points={fitPoints.map((point) => ({ temperatureK: point.temperatureK, lnK: point.lnK }))} unit="cm2 molecule-1 s-1" logarithm="ln" line={{ lnPreExponential: 29.93, energyKJPerMol: 132, uLnPreExponential: 0.9, uEnergyKJPerMol: 3.6 }} />
      </PlotFrame>
      <PlotFrame title="Activation energies by source">
        <IntervalPlot rows={intervalRows} what="Activation energy" unit="kJ/mol" rowName="Source" pooled={{ mean: 154.2, interval: [142.1, 166.3], predictionInterval: [118, 190] }} />
      </PlotFrame>
      <PlotFrame title="With one left out">
        <IntervalPlot rows={leftOneOut} what="Pooled activation energy" unit="kJ/mol" rowName="Left out" intervalLabel="95 % interval without this value" reference={{ value: 154.2, label: 'all values' }} />
      </PlotFrame>
      <PlotFrame title="Kinetic isotope effects">
        <KiePlot
          temperatureK={temperatureK} limit={(t) => Math.exp((1.438777 * (3350 - 2450)) / (2 * t))}
          lines={[
            { id: 'a', label: 'NH3/ND3 on Ru(0001), Vantongeren 1994', kie: (t) => 0.95 * Math.exp(3400 / (R * t)), range: { min: 450, max: 650 } },
            { id: 'b', label: 'NH3/ND3 on Ni(111), Petrescu 1988', kie: (t) => 1.1 * Math.exp(1200 / (R * t)), range: { min: 500, max: 800 } },
            { id: 'c', label: 'inverse, Haldane-Roux 2003', kie: (t) => Math.exp(-900 / (R * t)) },
          ]}
          points={[{ id: 'p', label: 'Osei-Brandt 1999', temperatureK: 600, kie: 1.62, u: 0.12 }, { id: 'q', label: 'Brisebois 2011', temperatureK: 550, kie: 1.95, computed: true }]}
        />
      </PlotFrame>
      <PlotFrame title="Sixty lines" caption="Point at a name to see its line alone.">
        <ArrheniusPlot topAxis temperatureK={temperatureK} unit="s-1" height={320} lines={Array.from({ length: 60 }, (_, index) => ({ id: String(index), label: `Surface ${index + 1}, Author ${1960 + index}`, lnK: line(80 + index * 2, 28 + (index % 7)), uLnK: () => 0.5, range: index % 5 === 0 ? null : { min: 350 + index * 3, max: 600 + index * 4 } }))} />
      </PlotFrame>
      <PlotFrame title="Beyond the range of doubles">
        <ArrheniusPlot topAxis temperatureK={temperatureK} unit="s-1" lines={[{ id: 'a', label: 'very slow', lnK: line(9000, 30), range: { min: 300, max: 700 } }, { id: 'b', label: 'nothing at all', lnK: () => Number.NEGATIVE_INFINITY, range: null }]} />
      </PlotFrame>
      <PlotFrame title="Compensation">
        <CompensationPlot energyUnit="kJ/mol" unit="s-1" line={{ slope: 0.105, intercept: 10.3 }} points={intervalRows.slice(0, 4).map((row, index) => ({ id: row.id, label: row.label, energy: row.value ?? 0, uEnergy: row.u, lnA: 29.9 - index * 1.6, uLnA: index % 2 ? 0.8 : null, computed: row.computed }))} />
      </PlotFrame>
      <PlotFrame title="One pathway">
        <EnergyProfile pathways={pathways.slice(0, 1)} unit="kJ/mol" what="Enthalpy" />
      </PlotFrame>
      <div className="wide:col-span-2">
        <PlotFrame title="Two metals, the same steps">
          <EnergyProfile pathways={pathways.slice(0, 2)} unit="kJ/mol" what="Enthalpy" />
        </PlotFrame>
      </div>
      <div className="wide:col-span-2">
        <PlotFrame title="Alternative pathways with long names">
          <EnergyProfile pathways={[{ ...pathways[0], id: 'ru', label: 'Ru(0001), terrace', states: (pathways[0]?.states ?? []).map((state) => ({ ...state, energy: state.energy / 96.485, u: state.u && state.u / 96.485 })) }, longPathway, { ...longPathway, id: 'third', label: 'third', states: longPathway.states.map((state, index) => ({ ...state, label: `${state.label} (${index})`, energy: state.energy * 0.7 + 4 })) }]} unit="eV" digits={2} />
        </PlotFrame>
      </div>
    </section>
  );
}
