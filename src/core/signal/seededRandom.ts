/** A stream of random numbers that is the same wherever and whenever it is drawn. */
export interface SeededRandom {
  /** Uniform on [0, 1), 53 bits. */
  uniform(): number;
  /** Standard normal. */
  gaussian(): number;
  /** Uniform integer from 0 to below - 1. */
  below(below: number): number;
}

/**
 * Seeded random numbers: xoshiro128**, its state filled from the seed by splitmix32. Written out here so that
 * a seed kept in a file never changes its meaning.
 * @param seed  any number; its integer part modulo 2^32 and the next 32 bits are used
 * @see         Blackman & Vigna (2021), ACM Trans. Math. Softw. 47, 36
 */
export function seededRandom(seed: number): SeededRandom {
  const next = generator(seed);
  let spare: number | null = null;
  const uniform = () => ((next() >>> 5) * 67108864 + (next() >>> 6)) / 9007199254740992;

  function gaussian(): number {
    if (spare !== null) {
      const kept = spare;
      spare = null;
      return kept;
    }
    // 1 - uniform lies in (0, 1]: the logarithm is finite
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  }
  return { uniform, gaussian, below: (below) => Math.floor(uniform() * below) };
}

/** 32 random bits a call, as a signed integer. */
function generator(seed: number): () => number {
  const fill = splitmix(Math.trunc(seed) ^ Math.trunc(seed / 4294967296));
  let a = fill();
  let b = fill();
  let c = fill();
  let d = fill();
  return () => {
    const mixed = Math.imul(b, 5);
    const result = Math.imul((mixed << 7) | (mixed >>> 25), 9);
    const shifted = b << 9;
    c ^= a;
    d ^= b;
    b ^= c;
    a ^= d;
    c ^= shifted;
    d = (d << 11) | (d >>> 21);
    return result;
  };
}

function splitmix(state: number): () => number {
  return () => {
    state = (state + 0x9e3779b9) | 0;
    let z = state ^ (state >>> 16);
    z = Math.imul(z, 0x21f0aaad);
    z ^= z >>> 15;
    z = Math.imul(z, 0x735a2d97);
    return z ^ (z >>> 15);
  };
}
