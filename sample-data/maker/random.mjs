/**
 * Seeded random numbers: xoshiro128** (Blackman & Vigna 2021, ACM Trans. Math. Softw. 47, 36), its state
 * filled by splitmix32. Written here so that a seed keeps its meaning for good.
 * @param {number} seed any integer
 * @returns uniform numbers in [0, 1) with 53 bits, and standard normal ones by Marsaglia's polar method
 */
export function seededRandom(seed) {
  const state = filledState(seed);
  let spare = null;
  const uniform = () => ((next(state) >>> 5) * 67108864 + (next(state) >>> 6)) / 9007199254740992;
  const gaussian = () => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    let a = 0;
    let b = 0;
    let square = 0;
    do {
      a = 2 * uniform() - 1;
      b = 2 * uniform() - 1;
      square = a * a + b * b;
    } while (square >= 1 || square === 0);
    const factor = Math.sqrt((-2 * Math.log(square)) / square);
    spare = b * factor;
    return a * factor;
  };
  return { uniform, gaussian };
}

const rotated = (x, by) => (x << by) | (x >>> (32 - by));

function next(s) {
  const result = Math.imul(rotated(Math.imul(s[1], 5), 7), 9);
  const shifted = s[1] << 9;
  s[2] ^= s[0];
  s[3] ^= s[1];
  s[1] ^= s[2];
  s[0] ^= s[3];
  s[2] ^= shifted;
  s[3] = rotated(s[3], 11);
  return result;
}

function filledState(seed) {
  let z = seed | 0;
  return Int32Array.from({ length: 4 }, () => {
    z = (z + 0x9e3779b9) | 0;
    let x = z ^ (z >>> 16);
    x = Math.imul(x, 0x21f0aaad);
    x ^= x >>> 15;
    x = Math.imul(x, 0x735a2d97);
    return x ^ (x >>> 15);
  });
}
