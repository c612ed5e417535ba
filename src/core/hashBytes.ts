/**
 * Hash of some bytes, to tell contents apart (never to protect them): 64-bit FNV-1a, in 16 hexadecimal digits.
 * Written in 32-bit halves, since doubles hold no 64-bit product: with the prime 2^40 + 435,
 *     h (2^40 + 435) = hi 435 2^32 + (lo << 8) 2^32 + lo 435   (mod 2^64)
 * @param bytes what is hashed, in order
 * @see Fowler, Noll, Vo & Eastlake, "The FNV Non-Cryptographic Hash Algorithm" (IETF draft)
 */
export function hashBytes(bytes: ArrayLike<number>): string {
  let high = 0xcbf29ce4;
  let low = 0x84222325;
  for (let i = 0; i < bytes.length; i++) {
    const mixed = (low ^ bytes[i]) >>> 0;
    const product = mixed * 435;
    low = product >>> 0;
    high = (high * 435 + (mixed << 8) + Math.floor(product / 2 ** 32)) >>> 0;
  }
  return high.toString(16).padStart(8, "0") + low.toString(16).padStart(8, "0");
}
