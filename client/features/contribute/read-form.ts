import { entryInput, type EntryInput } from '#shared/contracts/entries.ts';
import type { EntryForm, QuantityForm } from './entry-form.ts';
import { citationFaults, cslOf } from './typed-citation.ts';

/** A fault the page itself finds: by the path of the field. */
export interface LocalFault {
  path: string;
  message: string;
}

export interface ReadForm {
  input: EntryInput;
  faults: LocalFault[];
  /** For each quantity of the input, the row of the form it was typed in. */
  rows: number[];
}

/** Reads a number as people type it; null when it is none. */
export function readNumber(typed: string): number | null {
  const bare = typed.trim().replace('\u2212', '-').replace(/\s*[x×·]\s*10\^?\{?([-+]?\d+)\}?$/i, 'e$1');
  if (!/^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(bare)) return null;
  const value = Number(bare);
  return Number.isFinite(value) ? value : null;
}

/**
 * Turns the form into the entry's input. What is empty is left out; what cannot be read is left out and named,
 * so that the rest can be saved meanwhile.
 */
export function readForm(form: EntryForm): ReadForm {
  const faults: LocalFault[] = [];
  const word = (typed: string) => typed.trim() || undefined;
  const number = (typed: string, path: string, check?: (value: number) => string | null): number | undefined => {
    if (!typed.trim()) return undefined;
    const value = readNumber(typed);
    const message = value === null ? `"${typed.trim().slice(0, 30)}" is no number. Type digits with a decimal point, such as 0.25 or 1.5e19.` : check?.(value);
    if (message) faults.push({ path, message });
    return value === null || message ? undefined : value;
  };
  const positive = (value: number) => (value > 0 ? null : 'This has to be greater than zero.');
  const kelvin = (value: number) => (value >= 1 && value <= 5000 ? null : 'A temperature here lies between 1 and 5000 K.');

  const rows: number[] = [];
  const quantities = form.quantities.flatMap((row, index) => {
    if (!row.asPrinted.trim() && !row.unitAsPrinted.trim()) return [];
    rows.push(index);
    return [readQuantity(row, `quantities.${index}`, number)];
  });

  const orders = form.kineticOrders.flatMap(({ species, order }, index): [string, number][] => {
    const value = number(order, `kineticOrders.${index}.order`);
    return species.trim() && value !== undefined ? [[species.trim(), value]] : [];
  });

  const min = number(form.validRange.min, 'validRange.min', kelvin);
  const max = number(form.validRange.max, 'validRange.max', kelvin);
  if (min !== undefined && max !== undefined && min > max) {
    faults.push({ path: 'validRange.max', message: `The range ends at ${max} K, below its start at ${min} K. Exchange the two.` });
  }

  const { conditions: typed } = form;
  const assembled: Record<string, unknown> = {
    kind: form.kind || undefined,
    scope: form.scope || undefined,
    provenance: form.provenance || undefined,
    step: part({ equation: word(form.step.equation), sitesAdded: (form.step.balancedAs && form.step.balancedAs === form.step.equation) || undefined }),
    surface: part({
      ...form.kept.surface,
      metal: form.surface.of === 'metal' ? word(form.surface.metal) : undefined,
      formula: form.surface.of === 'alloy' ? word(form.surface.formula) : undefined,
      structure: form.surface.structure || undefined,
      facet: word(form.surface.facet),
      site: form.surface.site || undefined,
      sampleType: form.surface.sampleType || undefined,
      support: word(form.surface.support),
      particleSizeNm: number(form.surface.particleSizeNm, 'surface.particleSizeNm', positive),
    }),
    source: readSource(form, faults),
    locator: word(form.locator),
    method: part({ class: form.method.class || undefined, technique: word(form.method.technique), detail: word(form.method.detail) }),
    quantities: quantities.length > 0 ? quantities : undefined,
    correlation: number(form.correlation, 'correlation', (value) => (Math.abs(value) <= 1 ? null : 'A correlation lies between -1 and 1.')),
    rateOf: form.rateOf.counts === 'consumption'
      ? form.rateOf.species.trim() ? { consumptionOf: form.rateOf.species.trim() } : undefined
      : form.rateOf.counts || undefined,
    kineticOrders: orders.length > 0 ? Object.fromEntries(orders) : undefined,
    conditions: part({
      ...form.kept.conditions,
      coverage: word(typed.coverage), coverageDefinition: word(typed.coverageDefinition), pressures: word(typed.pressures),
      temperatureK: number(typed.temperatureK, 'conditions.temperatureK', kelvin),
      siteDensityPerM2: number(typed.siteDensityPerM2, 'conditions.siteDensityPerM2', positive),
      siteDensitySource: word(typed.siteDensitySource), promoter: word(typed.promoter),
      heatingRateKPerS: number(typed.heatingRateKPerS, 'conditions.heatingRateKPerS', positive),
      exposureLangmuir: number(typed.exposureLangmuir, 'conditions.exposureLangmuir', positive),
      functional: word(typed.functional), supercell: word(typed.supercell), endStateReference: word(typed.endStateReference),
      isotopes: word(typed.isotopes), kieDirection: word(typed.kieDirection), text: word(typed.text),
    }),
    validRange: part({ min, max }),
    note: word(form.note),
  };

  const parsed = entryInput.safeParse(part(assembled) ?? {});
  if (parsed.success) return { input: parsed.data, faults, rows };
  for (const issue of parsed.error.issues) faults.push({ path: issue.path.map(String).join('.'), message: issue.message });
  for (const issue of parsed.error.issues) delete assembled[String(issue.path[0])];
  return { input: entryInput.parse(part(assembled) ?? {}), faults, rows };
}

function readQuantity(
  row: QuantityForm, path: string, number: (typed: string, path: string, check?: (value: number) => string | null) => number | undefined,
): Record<string, unknown> {
  const kind = row.uncertaintyKind || undefined;
  return part({
    symbol: row.symbol,
    energyType: row.symbol === 'energy' ? row.energyType || undefined : undefined,
    // Exactly as typed: spaces inside are the source's, those around are a slip of the hand.
    asPrinted: row.asPrinted.trim(),
    unitAsPrinted: row.unitAsPrinted.trim(),
    multiplier: number(row.multiplier, `${path}.multiplier`, (value) => (value > 0 ? null : 'A multiplier is greater than zero.')),
    uncertaintyKind: kind,
    coverageFactor: kind === 'expanded'
      ? number(row.coverageFactor, `${path}.coverageFactor`, (value) => (value > 0 && value <= 10 ? null : 'A coverage factor lies between 0 and 10, usually 2.'))
      : undefined,
    level: kind === 'confidence'
      ? number(row.level, `${path}.level`, (value) => (value > 0 && value < 1 ? null : 'A level lies between 0 and 1, such as 0.95.'))
      : undefined,
    degreesOfFreedom: kind === 'confidence'
      ? number(row.degreesOfFreedom, `${path}.degreesOfFreedom`, (value) => (Number.isInteger(value) && value > 0 ? null : 'Degrees of freedom are a whole number from 1.'))
      : undefined,
  }) as Record<string, unknown>;
}

function readSource({ source }: EntryForm, faults: LocalFault[]): Record<string, unknown> | undefined {
  switch (source.via) {
    case 'id': return { id: source.id };
    case 'doi': return { doi: source.doi };
    case 'bibtex': return { bibtex: source.text };
    case 'ris': return { ris: source.text };
    case 'typed': {
      for (const { path, message } of citationFaults(source.typed)) faults.push({ path: `source.typed.${path}`, message });
      return part({ csl: cslOf(source.typed) });
    }
    default: return undefined;
  }
}

/** An object without what is undefined; undefined itself when nothing is left. */
function part(members: Record<string, unknown>): Record<string, unknown> | undefined {
  const kept = Object.entries(members).filter(([, value]) => value !== undefined);
  return kept.length > 0 ? Object.fromEntries(kept) : undefined;
}

/** Whether anything was typed that is worth a draft: a kind chosen by itself is not. */
export function isWorthSaving(input: EntryInput): boolean {
  const { kind: _kind, scope: _scope, provenance: _provenance, ...rest } = input;
  return Object.keys(rest).length > 0;
}
