/** Whether places in a drawing lie on one straight axis with the values: equal steps of value are equal steps of place. */
export function onOneAxis(values: readonly number[], places: readonly number[], tolerance = 1e-6): boolean {
  const [v0 = 0, p0 = 0] = [values[0], places[0]];
  const far = values.reduce((best, value, index) => (Math.abs(value - v0) > Math.abs((values[best] ?? v0) - v0) ? index : best), 0);
  const slope = ((places[far] ?? 0) - p0) / ((values[far] ?? 0) - v0);
  return values.length === places.length && Number.isFinite(slope) && slope !== 0
    && values.every((value, index) => Math.abs(p0 + slope * (value - v0) - (places[index] ?? Number.NaN)) <= tolerance * Math.max(1, Math.abs(slope)));
}

/** The numbers of an attribute, in order. */
export function numbersIn(text: string | null | undefined): number[] {
  return [...(text ?? '').matchAll(/-?\d+(?:\.\d+)?(?:e-?\d+)?/g)].map(([number]) => Number(number));
}

export function attribute(element: Element | null | undefined, name: string): number {
  return Number(element?.getAttribute(name));
}
