import { KineticsError } from './kinetics-error.ts';

const mask = (1n << 64n) - 1n;

/**
 * The next state and output of SplitMix64, which spreads a small seed over many bits.
 *
 * Source: Steele, Lea and Flood, OOPSLA 2014, 453; the constants of Vigna's public-domain splitmix64.c.
 * @example splitMix64(1234567n).output // 6457827717110365317n
 */
export function splitMix64(state: bigint): { state: bigint; output: bigint } {
  const next = (state + 0x9e3779b97f4a7c15n) & mask;
  let z = next;
  z = ((z ^ (z >> 30n)) * 0xbf58476d1ce4e5b9n) & mask;
  z = ((z ^ (z >> 27n)) * 0x94d049bb133111ebn) & mask;
  return { state: next, output: z ^ (z >> 31n) };
}

const rotate = (x: number, by: number): number => (x << by) | (x >>> (32 - by));

/**
 * A sequence of pseudo-random numbers that a seed repeats exactly, on every machine: xoshiro128** 1.1.
 *
 * Good for sampling, not for secrets. Source: Blackman and Vigna, ACM Trans. Math. Softw. 47 (2021) 36; made by `seededRandom`.
 */
export class RandomSequence {
  private s0: number;
  private s1: number;
  private s2: number;
  private s3: number;
  /** The second deviate of the last pair, or null. */
  private spare: number | null = null;

  constructor(state: readonly [number, number, number, number]) {
    [this.s0, this.s1, this.s2, this.s3] = state;
    if ((this.s0 | this.s1 | this.s2 | this.s3) === 0) throw new KineticsError('seed', 'the state of a random sequence must not be all zero', 'out-of-range', 0);
  }

  /** A whole number from 0 to 2^32 - 1. */
  uint32(): number {
    const result = Math.imul(rotate(Math.imul(this.s1, 5), 7), 9) >>> 0;
    const t = this.s1 << 9;
    this.s2 ^= this.s0;
    this.s3 ^= this.s1;
    this.s1 ^= this.s2;
    this.s0 ^= this.s3;
    this.s2 ^= t;
    this.s3 = rotate(this.s3, 11);
    return result;
  }

  /** A number above 0 and below 1, of 2^32 equally spaced ones. */
  uniform(): number {
    return (this.uint32() + 0.5) / 4294967296;
  }

  /**
   * A deviate of the standard normal distribution, within ± 6.8.
   *
   * Source: Box and Muller, Ann. Math. Stat. 29 (1958) 610.
   */
  normal(): number {
    if (this.spare !== null) {
      const { spare } = this;
      this.spare = null;
      return spare;
    }
    const radius = Math.sqrt(-2 * Math.log(this.uniform()));
    const angle = 2 * Math.PI * this.uniform();
    this.spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  }
}

/**
 * The random sequence of a seed: its state is filled by SplitMix64.
 *
 * Source: Blackman and Vigna, ACM Trans. Math. Softw. 47 (2021) 36, on seeding.
 * @param seed a whole number from 0 to 2^53 - 1
 * @throws KineticsError on a seed that is none.
 * @example [seededRandom(7).uint32() === seededRandom(7).uint32(), seededRandom(7).uint32() === seededRandom(8).uint32()] // [true, false]
 */
export function seededRandom(seed: number): RandomSequence {
  if (!Number.isSafeInteger(seed) || seed < 0) throw new KineticsError('seed', `seed must be a whole number from 0 to 2^53 - 1, got ${seed}`, 'out-of-range', seed);
  const first = splitMix64(BigInt(seed));
  const second = splitMix64(first.state);
  const words = [first.output, second.output].flatMap((output) => [Number(output & 0xffffffffn), Number(output >> 32n)]);
  return new RandomSequence(words as [number, number, number, number]);
}
