export function seededRandom(seed: number): { uniform(): number; gaussian(): number };
