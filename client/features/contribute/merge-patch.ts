type Json = unknown;

function isObject(value: Json): value is Record<string, Json> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** Whether two JSON values say the same; the order of members does not matter, a member that is undefined is absent. */
export function sameJson(a: Json, b: Json): boolean {
  if (Array.isArray(a) && Array.isArray(b)) return a.length === b.length && a.every((item, index) => sameJson(item, b[index]));
  if (isObject(a) && isObject(b)) {
    const names = new Set([...Object.keys(a), ...Object.keys(b)]);
    return [...names].every((name) => sameJson(a[name], b[name]));
  }
  return a === b;
}

/**
 * The JSON Merge Patch (RFC 7396) that turns `before` into `after`: changed top-level parts whole, with null for each member
 * that went; null for a part that went. Empty when nothing changed.
 * @example mergePatch({ note: 'a' }, {}) // { note: null }
 */
export function mergePatch(before: Record<string, Json>, after: Record<string, Json>): Record<string, Json> {
  const patch: Record<string, Json> = {};
  for (const name of new Set([...Object.keys(before), ...Object.keys(after)])) {
    const next = after[name];
    if (sameJson(before[name], next)) continue;
    patch[name] = next === undefined ? null : withRemovals(before[name], next);
  }
  return patch;
}

/** A part whole, naming with null the members it had before and has no longer. */
function withRemovals(before: Json, after: Json): Json {
  if (!isObject(before) || !isObject(after)) return after;
  const whole: Record<string, Json> = {};
  for (const name of Object.keys(before)) if (after[name] === undefined) whole[name] = null;
  for (const [name, value] of Object.entries(after)) if (value !== undefined) whole[name] = withRemovals(before[name], value);
  return whole;
}
