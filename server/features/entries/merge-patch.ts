/**
 * JSON Merge Patch (RFC 7396): objects are merged, null takes a member away, anything else (arrays whole) replaces.
 * @example mergePatch({ a: 1, b: { c: 2 } }, { a: null, b: { d: 3 } }) // { b: { c: 2, d: 3 } }
 */
export function mergePatch(target: unknown, patch: unknown): unknown {
  if (!isPlainObject(patch)) return patch;
  const result: Record<string, unknown> = isPlainObject(target) ? { ...target } : {};
  for (const [name, value] of Object.entries(patch)) {
    if (name === '__proto__') continue;
    if (value === null) delete result[name];
    else result[name] = mergePatch(result[name], value);
  }
  return result;
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
