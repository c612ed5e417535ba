/** The sections of the page in the order of its argument; what the index and the headings both print. */
export interface SectionName {
  readonly id: string;
  readonly number: number;
  /** In the index. */
  readonly short: string;
  /** Beside the section. */
  readonly name: string;
}

export const sectionList = {
  records: { id: "records", number: 1, short: "Records", name: "Records" },
  decay: { id: "decay", number: 2, short: "Decay", name: "Intensity and decay" },
  isotropy: { id: "isotropy", number: 3, short: "Isotropy", name: "Isotropy" },
  scales: { id: "scales", number: 4, short: "Scales", name: "Length scales" },
  spectra: { id: "spectra", number: 5, short: "Spectra", name: "Spectra and correlations" },
  balance: { id: "balance", number: 6, short: "Balance", name: "Dissipation balance" },
  compare: { id: "compare", number: 7, short: "Side by side", name: "Side by side" },
  table: { id: "table", number: 9, short: "Table", name: "Table and export" },
} as const satisfies Record<string, SectionName>;
