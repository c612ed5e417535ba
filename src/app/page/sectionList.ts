/** The sections of the page; what the index and the headings both print. */
export interface SectionName {
  readonly id: string;
  readonly number: number;
  /** In the index. */
  readonly short: string;
  /** Beside the section. */
  readonly name: string;
}

const named = [
  { id: "records", short: "Records", name: "Records" },
  { id: "decay", short: "Decay", name: "Intensity and decay" },
  { id: "isotropy", short: "Isotropy", name: "Isotropy" },
  { id: "scales", short: "Scales", name: "Length scales" },
  { id: "spectra", short: "Spectra", name: "Spectra and correlations" },
  { id: "balance", short: "Balance", name: "Dissipation balance" },
  { id: "compare", short: "Side by side", name: "Side by side" },
  { id: "body", short: "Body", name: "At the body" },
  { id: "table", short: "Table", name: "Table and export" },
] as const;

export type SectionId = (typeof named)[number]["id"];

/** In the order of the argument, numbered as they stand. */
export const sectionList: readonly (SectionName & { readonly id: SectionId })[] = named.map((section, i) => ({
  ...section,
  number: i + 1,
}));

const byId = Object.fromEntries(sectionList.map((section) => [section.id, section])) as Readonly<
  Record<SectionId, SectionName>
>; // one entry for each id of the list above

export function sectionOf(id: SectionId): SectionName {
  return byId[id];
}
