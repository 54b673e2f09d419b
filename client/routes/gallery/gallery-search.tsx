import { useState } from 'react';
import { useInstrument } from '#client/lib/instrument.ts';
import { decimalsOf, energyIn, fixed, setNumber } from '#client/lib/numbers.ts';
import { Button } from '#client/ui/button.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { InputField } from '#client/ui/field.tsx';
import { NumberPicker } from '#client/ui/number-picker.tsx';
import { Picker } from '#client/ui/picker.tsx';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';
import { Strip, type StripRange } from '#client/ui/strip.tsx';
import { DataTable, type DataColumn, type TableSort } from '#client/ui/table.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Tray } from '#client/ui/tray.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { Aligned, PlusMinus, Value } from '#client/ui/value.tsx';
import { galleryRows, type GalleryRow } from './rows.ts';

const metals = ['Ru', 'Ni', 'Co', 'Fe', 'Rh', 'Ir', 'Pt', 'Pd', 'Cu'].map((value, index) => ({ value, label: value, count: 97 - index * 11 }));

/** The query sentence, the strip and the table with its tray. */
export function GallerySearch() {
  const { unit, temperatureK } = useInstrument();
  const [metal, setMetal] = useState<string[]>(['Ru', 'Ni']);
  const [method, setMethod] = useState<string[]>([]);
  const [validAt, setValidAt] = useState<number | null>(null);
  const [sort, setSort] = useState<TableSort | null>(null);
  const [chosen, setChosen] = useState(new Set(['a', 'b']));
  const [active, setActive] = useState<string | null>(null);
  const [range, setRange] = useState<StripRange>({ min: null, max: null });
  const max = Math.max(...galleryRows.map((one) => energyIn(unit, one.energy ?? one.high ?? one.low ?? 0)));
  const glyph = (one: GalleryRow) => (
    <SillGlyph
      energy={one.energy === null ? null : energyIn(unit, one.energy)}
      low={one.low === undefined ? null : energyIn(unit, one.low)}
      high={one.high === undefined ? null : energyIn(unit, one.high)}
      reactionEnergy={one.reactionEnergy === undefined ? null : energyIn(unit, one.reactionEnergy)}
      u={one.u === null ? null : energyIn(unit, one.u)}
      bound={one.bound} computed={one.computed} max={max} unit={unit}
    />
  );
  const places = unit === 'kJ/mol' ? 0 : unit === 'kcal/mol' ? 1 : 2;
  const columns: DataColumn<GalleryRow>[] = [
    { id: 'surface', header: 'Surface', cell: (one) => one.surface, rowHeader: true, sortKey: 'metal' },
    { id: 'glyph', header: '', headerText: 'Barrier, drawn', cell: glyph },
    {
      id: 'energy', header: <>E<sub>a</sub></>, headerText: 'Activation energy', unit, numeric: true, sortKey: 'energy', firstDescending: true,
      cell: (one) => (one.bound === 'range'
        ? <Value value={null} low={energyIn(unit, one.low ?? 0)} high={energyIn(unit, one.high ?? 0)} bound="range" significantDigits={1} />
        : <Aligned strong number={setNumber(energyIn(unit, one.energy ?? one.low ?? 0), { scientific: false, decimals: places })} decimals={places} bound={one.bound} />),
    },
    { id: 'u', header: 'standard', unit: 'uncertainty', cell: (one) => (one.bound === '=' ? <PlusMinus u={one.u === null ? null : energyIn(unit, one.u)} decimals={one.u === null ? 0 : decimalsOf(one.u, { u: energyIn(unit, one.u), uDigits: 1 })} /> : null) },
    { id: 'printed', header: 'as printed', cell: (one) => one.printed, printed: true },
    {
      id: 'k', header: `k at ${temperatureK} K`, unit: <UnitText unit="s-1" />, numeric: true, sortKey: 'k', firstDescending: true,
      cell: (one) => (one.k === null ? <span className="text-second">no A reported</span> : <>{one.extrapolated && <><Tag kind="doubt">extrapolated</Tag>{' '}</>}<Aligned number={setNumber(one.k, { scientific: true, digits: 2 })} decimals={1} power /></>),
    },
    { id: 'method', header: 'Method', cell: (one) => <>{one.method} {one.computed && <Tag>computed</Tag>}{one.scope === 'apparent' && <Tag>apparent</Tag>}</> },
    { id: 'range', header: 'valid range', unit: 'K', cell: (one) => one.range },
    { id: 'source', header: 'Source', cell: (one) => <a href="#source">{one.source}</a>, sortKey: 'year' },
  ];
  return (
    <section>
      <div className="sentence" role="group" aria-label="What is shown">
        Show <Picker label="Quantity" summary="activation energies" options={[{ value: 'e', label: 'activation energies', count: 312 }, { value: 'k', label: 'rate constants', count: 140 }]} chosen={['e']} onChange={() => undefined} multiple={false} />
        {' for '}<Picker label="Elementary step" summary="any step" options={[]} chosen={[]} onChange={() => undefined} />
        {' on '}<Picker label="Metal" summary={metal.length ? metal.join(', ') : 'any metal'} options={metals} chosen={metal} onChange={setMetal} clearLabel="Any metal" />
        {' by '}<Picker label="Method" summary={method.length ? method.join(', ') : 'any method'} options={[{ value: 'TPD', label: 'TPD' }, { value: 'DFT', label: 'DFT' }]} chosen={method} onChange={setMethod} clearLabel="Any method" />
        , valid at <NumberPicker label="Valid at" value={validAt} unit="K" unset="any temperature" min={1} max={5000} onChange={setValidAt} offer={{ value: temperatureK, label: `${temperatureK} K` }} />.
      </div>
      <div className="flex flex-wrap items-center gap-3 py-5">
        <InputField className="w-full max-w-[380px]" label="Also containing" hideLabel placeholder="also containing: step edge, potassium, author …" />
        <span className="text-second">10 of 412 entries</span>
      </div>
      <div className="section-line flex flex-wrap items-baseline gap-x-6 gap-y-1 pb-2 text-second">
        <h2 className="text-ink">10 entries</h2><span>17 sources</span><span>median 98 kJ/mol, 14 to 186</span>
      </div>
      <Strip
        what="Activation energy" unit={unit} activeId={active} onActive={setActive} chosen={chosen} range={range} onRange={setRange}
        points={galleryRows.map((one) => {
          const value = energyIn(unit, one.energy ?? one.low ?? 0);
          return { id: one.id, value, bound: one.bound, computed: one.computed, label: `${one.surface}, ${fixed(value, 0)} ${unit}, ${one.source}` };
        })}
      />
      <DataTable
        caption="Entries found" columns={columns} rows={galleryRows} rowId={(one) => one.id} rowLabel={(one) => `${one.surface}, ${one.source}`}
        sort={sort} onSort={setSort} chosen={chosen} onChosen={setChosen} activeId={active} onActive={setActive}
        group={(one) => ({ key: one.equation, label: <><Equation equation={one.equation} display /> <span className="table-group-note">{one.stepClass}</span></> })}
        stanza={(one) => (
          <>
            <div className="stanza-line justify-between"><strong>{one.surface}</strong>{glyph(one)}</div>
            <div className="stanza-line"><Value value={one.energy === null ? null : energyIn(unit, one.energy)} low={one.low === undefined ? null : energyIn(unit, one.low)} high={one.high === undefined ? null : energyIn(unit, one.high)} bound={one.bound} u={one.u === null ? null : energyIn(unit, one.u)} uDigits={1} unit={unit} significantDigits={2} />{one.computed && <Tag>computed</Tag>}{one.extrapolated && <Tag kind="doubt">extrapolated</Tag>}</div>
            <div className="stanza-line"><samp className="printed">{one.printed}</samp></div>
            <div className="stanza-quiet">{one.source}, {one.method}</div>
          </>
        )}
      />
      <Tray count={chosen.size} onClear={() => setChosen(new Set())}>
        <Button>Compare</Button><Button>Export CSV + BibTeX</Button><Button>Add to collection</Button>
      </Tray>
    </section>
  );
}
