/** The nouns that travel between the rooms: files, columns, blocks of samples, positions. */

/** What a column of a file can be taken as; the trade's names, as in the case sheet. */
export const recordRoles = ["x", "y", "z", "t", "u", "v", "w"] as const;
export const profileRoles = [
  "x",
  "t",
  "U",
  "uu",
  "vv",
  "ww",
  "uv",
  "u_rms",
  "v_rms",
  "w_rms",
  "q",
  "se",
  "lambda",
  "L",
  "epsilon",
] as const;
export type RecordRole = (typeof recordRoles)[number];
export type ProfileRole = (typeof profileRoles)[number];
export type Role = RecordRole | ProfileRole;

export type Layout = "series" | "lines" | "profile";
export type Separator = "," | ";" | "\t" | " ";

/** One column chosen by the sheet or recognised: which column of the file, and its unit there. */
export interface ColumnChoice {
  /** The file's own heading, or its 1-based number where the file has none. */
  readonly from: string | number;
  /** As written, e.g. "cm/s"; null: the unit of the case. */
  readonly unit: string | null;
}
export type ColumnChoices = Readonly<Partial<Record<Role, ColumnChoice>>>;

/**
 * What time stamps with too few digits are taken for, where they agree with a constant step: "even", that step stands
 * in their place; "written", they are what they say; "ask", it is not decided, and what needs the step is missing.
 */
export type RoundedTimes = "ask" | "even" | "written";

/** How one file is read. What is null is recognised from the file itself. */
export interface ReadSettings {
  readonly layout: Layout;
  readonly units: "SI" | "nondimensional";
  readonly columns: ColumnChoices | null;
  readonly separator: Separator | null;
  readonly decimal: "." | "," | null;
  /** 1-based line of the heading; 0: the file has none; null: recognised. */
  readonly heading: number | null;
  /** Time between samples where the file has no time column, in the case's unit; null: from the file. */
  readonly step: number | null;
  /** Time stamps with too few digits; left out: "ask". */
  readonly times?: RoundedTimes;
  /** Tokens that mean "no value". */
  readonly missing: readonly string[];
  /** Position given by the sheet, in the case's unit; null: from the file. */
  readonly x: number | null;
  /** x of the grid or inflow in the file's own axis, subtracted. */
  readonly zero: number;
  /** Time left out at the start of the record. */
  readonly startup: number;
  /** Layout "profile": the column that stands for x; left out: "x". */
  readonly along?: "x" | "t";
}

/** Where a position came from; printed beside it and written to the results. */
export type PositionSource = "sheet" | "column" | "comment" | "name" | "hand";

/** Some samples of one probe, in order of time: a column block. Arrays are of length `count` or longer. */
export interface VelocityBlock {
  readonly count: number;
  /** Null where the file has no time column: the step is the record's. */
  readonly t: Float64Array | null;
  readonly u: Float64Array;
  readonly v: Float64Array | null;
  readonly w: Float64Array | null;
}

/** Where a record stands and came from. */
export interface RecordOrigin {
  readonly file: string;
  readonly x: number;
  readonly y: number | null;
  readonly z: number | null;
  readonly position: PositionSource;
  /** Time between samples where the blocks carry no time. */
  readonly step: number | null;
}

/** One row of statistics that were reduced elsewhere (layout "profile"); absent columns are null. */
export interface ProfileRow {
  readonly file: string;
  /** 1-based line in the file. */
  readonly line: number;
  readonly x: number;
  readonly values: Readonly<Partial<Record<Exclude<ProfileRole, "x" | "t">, number>>>;
}

/** What a first look at a file tells, before anything is reduced. */
export interface Preview {
  readonly file: string;
  readonly bytes: number;
  readonly separator: Separator;
  readonly decimal: "." | ",";
  /** 1-based line of the heading, 0 for none. */
  readonly heading: number;
  readonly layout: Layout;
  readonly columns: readonly PreviewColumn[];
  /** First data lines, as they stand in the file. */
  readonly firstRows: readonly (readonly string[])[];
  readonly comments: readonly string[];
  readonly position: {
    readonly x: number | null;
    readonly source: PositionSource | null;
    readonly matched: string | null;
    /** How it was read, in words: "after x in the name, in mm". */
    readonly rule?: string;
  };
  /** Roles that several columns could be, with their 1-based numbers: for the user to decide. */
  readonly clashes?: readonly { readonly role: Role; readonly columns: readonly number[] }[];
  /** Time between the first samples, in the case's unit; null without a time column or note. */
  readonly step: number | null;
  /** Estimated from the bytes of the first lines. */
  readonly estimatedRows: number;
}

export interface PreviewColumn {
  /** The file's own heading, without its unit; "" where there is none. */
  readonly heading: string;
  /** 1-based. */
  readonly number: number;
  readonly role: Role | null;
  /** As written in the heading; null where none is. */
  readonly unit: string | null;
}

/** A file that was read, for the results file. */
export interface SourceNote {
  readonly name: string;
  readonly bytes: number;
  readonly x: number | null;
  readonly position: PositionSource | null;
}
