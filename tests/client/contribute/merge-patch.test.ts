import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mergePatch, sameJson } from '#client/features/contribute/merge-patch.ts';
import { mergePatch as applyPatch } from '#server/features/entries/merge-patch.ts';

describe('the patch between two versions of a draft', () => {
  it.each([
    [{}, {}, {}],
    [{ note: 'a' }, { note: 'a' }, {}],
    [{ note: 'a' }, {}, { note: null }],
    [{}, { note: 'a' }, { note: 'a' }],
    [{ surface: { metal: 'Ni', facet: '111' } }, { surface: { metal: 'Ru' } }, { surface: { facet: null, metal: 'Ru' } }],
    [{ source: { doi: '10.5555/x' } }, { source: { id: 's1' } }, { source: { doi: null, id: 's1' } }],
    [{ rateOf: 'event' }, { rateOf: { consumptionOf: 'N' } }, { rateOf: { consumptionOf: 'N' } }],
    [{ quantities: [{ asPrinted: '1' }] }, { quantities: [{ asPrinted: '2' }, { asPrinted: '3' }] }, { quantities: [{ asPrinted: '2' }, { asPrinted: '3' }] }],
    [{ a: { b: 1, c: 2 } }, { a: { c: 2, b: 1 } }, {}],
  ])('from %j to %j is %j', (before, after, patch) => {
    expect(mergePatch(before, after)).toEqual(patch);
  });

  // RFC 7396 has no way to say null, so neither side holds one.
  const leaf = fc.oneof(fc.string(), fc.double({ noNaN: true, noDefaultInfinity: true }), fc.boolean());
  const name = fc.stringMatching(/^[a-d]{1,2}$/);
  const json = fc.letrec((tie) => ({
    value: fc.oneof({ depthSize: 'small' }, leaf, fc.array(leaf, { maxLength: 3 }), tie('object')),
    object: fc.dictionary(name, tie('value'), { maxKeys: 4, noNullPrototype: true }),
  })).object as fc.Arbitrary<Record<string, unknown>>;

  it('applied by the server to the one gives the other', () => {
    fc.assert(fc.property(json, json, (before, after) => sameJson(applyPatch(before, mergePatch(before, after)), after)));
  });
});
