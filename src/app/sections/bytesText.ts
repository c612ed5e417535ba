import { formatNumber, thinSpace } from "../../figures/formatNumber.ts";

/** "2.5 of 5.4 GB", both in the unit of the whole; the whole alone where all of it is meant. */
export function bytesText(part: number, whole: number): string {
  const [factor, unit] = whole >= 1e9 ? [1e9, "GB"] : whole >= 1e6 ? [1e6, "MB"] : [1e3, "kB"];
  const text = (bytes: number) => formatNumber(bytes / factor, whole / factor >= 100 ? 0 : 1);
  return part === whole
    ? `${text(whole)}${thinSpace}${unit}`
    : `${text(part)} of ${text(whole)}${thinSpace}${unit}`;
}
