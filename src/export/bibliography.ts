/** A published source that the program's methods rest on. */
export interface Source {
  readonly key: string;
  /** As the methods text names it. */
  readonly short: string;
  readonly type: "article" | "book";
  readonly fields: Readonly<Record<string, string>>;
}

const article = (
  key: string,
  short: string,
  author: string,
  title: string,
  journal: string,
  year: number,
  volume: string,
  pages: string,
): Source => ({
  key,
  short,
  type: "article",
  fields: { author, title, journal, year: String(year), volume, pages },
});

/** Every source that the methods text can name. */
export const sources = {
  pope: {
    key: "pope2000",
    short: "Pope (2000)",
    type: "book",
    fields: {
      author: "Pope, Stephen B.",
      title: "Turbulent Flows",
      publisher: "Cambridge University Press",
      year: "2000",
    },
  },
  welch: article(
    "welch1967",
    "Welch (1967)",
    "Welch, Peter D.",
    "The use of fast {F}ourier transform for the estimation of power spectra: a method based on time averaging over short, modified periodograms",
    "IEEE Transactions on Audio and Electroacoustics",
    1967,
    "15",
    "70--73",
  ),
  lenschow: article(
    "lenschow1994",
    "Lenschow, Mann & Kristensen (1994)",
    "Lenschow, D. H. and Mann, J. and Kristensen, L.",
    "How long is long enough when measuring fluxes and other turbulence statistics?",
    "Journal of Atmospheric and Oceanic Technology",
    1994,
    "11",
    "661--673",
  ),
  kuensch: article(
    "kunsch1989",
    "Künsch (1989)",
    'K{\\"u}nsch, Hans R.',
    "The jackknife and the bootstrap for general stationary observations",
    "The Annals of Statistics",
    1989,
    "17",
    "1217--1241",
  ),
  lumley: article(
    "lumley1965",
    "Lumley (1965)",
    "Lumley, John L.",
    "Interpretation of time spectra measured in high-intensity shear flows",
    "The Physics of Fluids",
    1965,
    "8",
    "1056--1062",
  ),
  wyngaard: article(
    "wyngaard1977",
    "Wyngaard & Clifford (1977)",
    "Wyngaard, J. C. and Clifford, S. F.",
    "{T}aylor's hypothesis and high-frequency turbulence spectra",
    "Journal of the Atmospheric Sciences",
    1977,
    "34",
    "922--929",
  ),
  karman: article(
    "karman1948",
    "von Kármán (1948)",
    "von K{\\'a}rm{\\'a}n, Theodore",
    "Progress in the statistical theory of turbulence",
    "Proceedings of the National Academy of Sciences",
    1948,
    "34",
    "530--539",
  ),
  saffman: article(
    "saffman1967",
    "Saffman (1967)",
    "Saffman, P. G.",
    "The large-scale structure of homogeneous turbulence",
    "Journal of Fluid Mechanics",
    1967,
    "27",
    "581--593",
  ),
  schuirmann: article(
    "schuirmann1987",
    "Schuirmann (1987)",
    "Schuirmann, Donald J.",
    "A comparison of the two one-sided tests procedure and the power approach for assessing the equivalence of average bioavailability",
    "Journal of Pharmacokinetics and Biopharmaceutics",
    1987,
    "15",
    "657--680",
  ),
  holm: article(
    "holm1979",
    "Holm (1979)",
    "Holm, Sture",
    "A simple sequentially rejective multiple test procedure",
    "Scandinavian Journal of Statistics",
    1979,
    "6",
    "65--70",
  ),
} as const satisfies Readonly<Record<string, Source>>;

/** Sources as BibTeX, each once, in the order given. */
export function bibTeX(used: readonly Source[]): string {
  return [...new Set(used)].map(entry).join("\n");
}

function entry({ key, type, fields }: Source): string {
  const lines = Object.entries(fields).map(([name, text]) => `  ${name} = {${text}}`);
  return `@${type}{${key},\n${lines.join(",\n")}\n}\n`;
}
