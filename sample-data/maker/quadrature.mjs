// Five-point Gauss-Legendre rule on [-1, 1]; Abramowitz & Stegun (1964) table 25.4.
const nodes = [0, 0.538469310105683, -0.538469310105683, 0.906179845938664, -0.906179845938664];
const weights = [
  0.568888888888889, 0.478628670499366, 0.478628670499366, 0.236926885056189, 0.236926885056189,
];

/**
 * Integrals of several functions over each cell of a logarithmic grid.
 * @param {(kappa: number) => number[]} integrands values at kappa, to be integrated d kappa
 * @param {Float64Array} edges cell edges, ascending, > 0
 * @returns {Float64Array[]} one array per integrand, one value per cell
 */
export function cellIntegrals(integrands, edges) {
  const cells = edges.length - 1;
  const sums = integrands(edges[0]).map(() => new Float64Array(cells));
  for (let cell = 0; cell < cells; cell++) {
    const middle = (Math.log(edges[cell]) + Math.log(edges[cell + 1])) / 2;
    const half = (Math.log(edges[cell + 1]) - Math.log(edges[cell])) / 2;
    for (let node = 0; node < nodes.length; node++) {
      const kappa = Math.exp(middle + half * nodes[node]);
      const values = integrands(kappa);
      for (let i = 0; i < sums.length; i++) sums[i][cell] += weights[node] * half * kappa * values[i];
    }
  }
  return sums;
}

/** `count` cells between two wavenumbers, equal in the logarithm. */
export function logarithmicGrid(first, last, count) {
  const ratio = Math.log(last / first) / count;
  return Float64Array.from({ length: count + 1 }, (_, i) => first * Math.exp(i * ratio));
}
