/** Colours by their use; what tells cases apart is in caseMark.ts. Doubt is a shape, never a hue. */
export interface Tokens {
  readonly paper: string;
  readonly ground: string;
  readonly well: string;
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly rule: string;
  readonly tol: string;
  readonly fault: string;
  /** In order of arrival; marker and dash tell them apart in grey print. */
  readonly cases: readonly string[];
}

export const lightTokens: Tokens = {
  paper: "#fbfcfb",
  ground: "#eff2f2",
  well: "#e4e9ea",
  ink: "#171d22",
  ink2: "#4a555e",
  ink3: "#5f6b75",
  rule: "#c9d0d3",
  tol: "#e9eeee",
  fault: "#9a2a22",
  cases: ["#1f5fae", "#c24a12", "#07532d", "#7a2b7a", "#bf7e1a", "#7c828b"],
};

export const darkTokens: Tokens = {
  paper: "#14181b",
  ground: "#1b2125",
  well: "#262d32",
  ink: "#e8ecee",
  ink2: "#aeb8bf",
  ink3: "#8f9aa2",
  rule: "#39424a",
  tol: "#20272b",
  fault: "#ff9c8f",
  cases: ["#74aaf5", "#f08a4b", "#a6f2e2", "#b9589a", "#f3e27a", "#c3c3c3"],
};

/** The light colours, black on white: every export, and the printed page. */
export const printTokens: Tokens = { ...lightTokens, paper: "#ffffff", ink: "#000000" };

/** A token as a translucent fill. */
export function faded(colour: string, share: number): string {
  const [red, green, blue] = [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16));
  return `rgba(${red},${green},${blue},${share})`;
}
