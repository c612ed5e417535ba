"""Bits of the seeded generator, in whole numbers, for test/core/signal/seededRandom.test.ts. Run: python3 make_random.py

xoshiro128** as published (Blackman & Vigna 2021), its four words filled by a 32-bit splitmix; nothing is taken from
the program. The first numbers from the state 1, 2, 3, 4 are those known for xoshiro128** (from memory).
"""
import json
import pathlib

MASK = 0xFFFFFFFF


def rotl(x, k):
    return ((x << k) | (x >> (32 - k))) & MASK


def xoshiro(state):
    s = list(state)
    while True:
        yield rotl(s[1] * 5 & MASK, 7) * 9 & MASK
        t = s[1] << 9 & MASK
        s[2] ^= s[0]
        s[3] ^= s[1]
        s[1] ^= s[2]
        s[0] ^= s[3]
        s[2] ^= t
        s[3] = rotl(s[3], 11)


def splitmix(z):
    while True:
        z = (z + 0x9E3779B9) & MASK
        x = z
        x = (x ^ (x >> 16)) * 0x21F0AAAD & MASK
        x = (x ^ (x >> 15)) * 0x735A2D97 & MASK
        yield x ^ (x >> 15)


known = xoshiro([1, 2, 3, 4])
assert [next(known) for _ in range(4)] == [11520, 0, 5927040, 70819200]

streams = []
for seed in (0, 1, 20261201, 4294967297, 2**40 + 12345):
    fill = splitmix((seed & MASK) ^ (seed >> 32))
    bits = xoshiro([next(fill) for _ in range(4)])
    uniform = []
    for _ in range(12):
        high, low = next(bits) >> 5, next(bits) >> 6
        uniform.append((high * 2**26 + low) / 2**53)
    streams.append({"seed": seed, "uniform": uniform})
path = pathlib.Path(__file__).with_name("random.json")
path.write_text(json.dumps({"streams": streams}, indent=0) + "\n")
