import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { accessionAlphabetSize, accessionFrom, readAccession } from '#shared/domain/accession.ts';

const indices = fc.array(fc.integer({ min: 0, max: accessionAlphabetSize - 1 }), { minLength: 6, maxLength: 6 });

describe('the accession', () => {
  it('has a prime number of characters, on which the check rests', () => {
    expect(accessionAlphabetSize).toBe(31);
    expect(accessionFrom([0, 0, 0, 0, 0, 0])).toBe('222-222-2');
  });

  it('is read as people type it', () => {
    fc.assert(fc.property(indices, (drawn) => {
      const accession = accessionFrom(drawn);
      expect(readAccession(accession)).toBe(accession);
      expect(readAccession(` ${accession.toLowerCase().replaceAll('-', ' ')} `)).toBe(accession);
    }));
  });

  it('finds every single wrong character and every swap of neighbours', () => {
    fc.assert(fc.property(indices, fc.nat(6), fc.nat(accessionAlphabetSize - 1), (drawn, place, other) => {
      const plain = accessionFrom(drawn).replaceAll('-', '');
      const wrong = accessionFrom([other, 0, 0, 0, 0, 0]).charAt(0);
      if (wrong !== plain[place]) expect(readAccession(plain.slice(0, place) + wrong + plain.slice(place + 1))).toBeNull();
      // The check character stands for itself, so that only swaps among the six are by the weights.
      if (place < 5 && plain[place] !== plain[place + 1]) {
        expect(readAccession(plain.slice(0, place) + plain.charAt(place + 1) + plain.charAt(place) + plain.slice(place + 2))).toBeNull();
      }
    }));
  });

  it.each(['', '222-222', '222-222-22', '0OI-222-2', 'nonsense'])('refuses %j', (text) => {
    expect(readAccession(text)).toBeNull();
  });

  it.each([[[1, 2, 3]], [[31, 0, 0, 0, 0, 0]], [[0.5, 0, 0, 0, 0, 0]]])('is not made from %j', (drawn) => {
    expect(() => accessionFrom(drawn)).toThrow(RangeError);
  });
});
