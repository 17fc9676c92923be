import { DomainError } from './errors.ts';

/** What a stream of random numbers is for: the same key gives the same numbers on every machine. */
export interface StreamKey {
  readonly seed: bigint;
  readonly purpose: string;
  readonly population?: number | undefined;
  readonly member?: number | undefined;
}

export interface RandomStream {
  /** Uniform in (0, 1), 53 bits. */
  nextUniform(): number;
  /** Normal of mean 0 and variance 1. */
  nextNormal(): number;
  /** Uniform among 0 ... bound - 1. */
  nextInteger(bound: number): number;
}

/**
 * A stream of random numbers for one key: xoshiro128**, seeded by SplitMix64 over an FNV-1a digest of the key.
 *
 * @source Blackman & Vigna, ACM Trans. Math. Softw. 47 (2021) 36; Steele, Lea & Flood, OOPSLA 2014; normals: Box & Muller,
 *   Ann. Math. Stat. 29 (1958) 610
 */
export function createRandomStream(key: StreamKey): RandomStream {
  const nextWord = createXoshiro128(stateOf(key));
  const nextUniform = (): number => {
    const high = nextWord() >>> 5;
    const low = nextWord() >>> 6;
    return (high * 67108864 + low + 0.5) / 9007199254740992;
  };
  return {
    nextUniform,
    nextNormal() {
      // Both uniforms are drawn each time: a stream must not depend on how many normals were asked for before.
      const radius = Math.sqrt(-2 * Math.log(nextUniform()));
      return radius * Math.cos(2 * Math.PI * nextUniform());
    },
    nextInteger(bound) {
      if (!Number.isInteger(bound) || bound < 1) throw new DomainError(`expected a bound >= 1, got ${bound}`);
      return Math.floor(nextUniform() * bound);
    },
  };
}

/** The generator itself; words are 32-bit, unsigned. Exported for its reference test. */
export function createXoshiro128(state: Uint32Array): () => number {
  let [a, b, c, d] = state;
  return () => {
    const result = Math.imul(rotateLeft(Math.imul(b, 5), 7), 9) >>> 0;
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = rotateLeft(d, 11);
    return result;
  };
}

function rotateLeft(word: number, bits: number): number {
  return (word << bits) | (word >>> (32 - bits));
}

const MASK = 0xffffffffffffffffn;

function stateOf({ seed, purpose, population = 0, member = 0 }: StreamKey): Uint32Array {
  let digest = 0xcbf29ce484222325n;
  for (const letter of `${seed}/${population}/${member}/${purpose}`) {
    digest = ((digest ^ BigInt(letter.codePointAt(0) ?? 0)) * 0x100000001b3n) & MASK;
  }
  const state = new Uint32Array(4);
  for (let i = 0; i < 4; i += 2) {
    digest = (digest + 0x9e3779b97f4a7c15n) & MASK;
    const word = splitMix(digest);
    state[i] = Number(word & 0xffffffffn);
    state[i + 1] = Number(word >> 32n);
  }
  return state;
}

function splitMix(value: bigint): bigint {
  let z = value;
  z = ((z ^ (z >> 30n)) * 0xbf58476d1ce4e5b9n) & MASK;
  z = ((z ^ (z >> 27n)) * 0x94d049bb133111ebn) & MASK;
  return z ^ (z >> 31n);
}
