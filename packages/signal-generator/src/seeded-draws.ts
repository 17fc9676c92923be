/** Random draws of this room: its own generator, so that truth and fit never share a stream. */
export interface SeededDraws {
  /** Uniform in (low, high). */
  uniform(low: number, high: number): number;
  /** Normal of mean 0 and sd 1. */
  normal(): number;
  /** One of 0 ... count - 1. */
  index(count: number): number;
}

/**
 * Draws from a seed: a 32-bit Weyl sequence through the two-round finaliser of a published hash.
 *
 * Seeds less than 10,000 apart share no word within 2^17 words of each other: multiples of the golden step keep their distance.
 *
 * @param seed any whole number from 0 to 2^32 - 1
 * @throws RangeError for another seed
 * @source finaliser: A. Appleby, MurmurHash3, fmix32 (constants from memory); sequence: Steele, Lea & Flood, OOPSLA 2014
 */
export function createSeededDraws(seed: number): SeededDraws {
  let state = seed >>> 0;
  if (state !== seed) throw new RangeError(`expected a seed that is a whole number from 0 to 2^32 - 1, got ${seed}`);
  const word = (): number => {
    state = (state + 0x9e3779b9) >>> 0;
    let z = state;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return (z ^ (z >>> 16)) >>> 0;
  };
  const unit = (): number => ((word() >>> 5) * 67108864 + (word() >>> 6) + 0.5) / 9007199254740992;
  return {
    uniform: (low, high) => low + (high - low) * unit(),
    normal: () => Math.sqrt(-2 * Math.log(unit())) * Math.cos(2 * Math.PI * unit()),
    index: (count) => Math.floor(unit() * count),
  };
}
