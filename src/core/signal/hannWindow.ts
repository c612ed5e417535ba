const windows = new Map<number, Float64Array>();

/**
 * Hann window, periodic: the point after the last would repeat the first,
 *     w_n = ½ (1 - cos 2πn/size)
 * Its transform is zero but in bins 0 (size/2) and ±1 (-size/4); mean square 3/8, noise bandwidth 1.5 bins.
 * @param size  points, ≥ 2
 * @returns     the window; one array a size, not to be written to
 * @see         Harris (1978), Proc. IEEE 66, 51
 */
export function hannWindow(size: number): Float64Array {
  let window = windows.get(size);
  if (!window) {
    window = new Float64Array(size);
    for (let n = 0; n < size; n++) window[n] = 0.5 * (1 - Math.cos((2 * Math.PI * n) / size));
    windows.set(size, window);
  }
  return window;
}
