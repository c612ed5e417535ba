import { formatNumber, thinSpace } from "./formatNumber.ts";

const units = ["B", "kB", "MB", "GB", "TB"];

/** A size as storage is sold: powers of a thousand, two digits below ten. */
export function formatBytes(bytes: number): string {
  let [size, step] = [bytes, 0];
  while (size >= 999.5 && step < units.length - 1) {
    size /= 1000;
    step++;
  }
  return `${formatNumber(size, step > 0 && size < 9.95 ? 1 : 0)}${thinSpace}${units[step]}`;
}
