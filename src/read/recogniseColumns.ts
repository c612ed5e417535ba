import type { Layout, Role } from "../core/records.ts";
import type { Heading } from "./heading.ts";

/** What each column of a file was taken as, from the headings alone. */
export interface RecognisedColumns {
  readonly layout: Layout;
  /** One for each column; null: not used. */
  readonly roles: readonly (Role | null)[];
  /** Roles that several columns claim alike, with their 1-based numbers; none of them was taken. */
  readonly clashes: readonly { readonly role: Role; readonly columns: readonly number[] }[];
}

const time = "t time zeit temps tiempo tempo sec secs seconds timestamp elapsedtime flowtime simulationtime";
const places: Spellings = {
  x: "x xpos posx xposition positionx xcoord xcoordinate coordx x1 station position",
  y: "y ypos posy yposition positiony ycoord ycoordinate coordy x2",
  z: "z zpos posz zposition positionz zcoord zcoordinate coordz x3",
};
const series: Spellings = {
  ...places,
  t: time,
  u: "u ux vx u1 velx velocityx uvel uvelocity velocityu streamwise streamwisevelocity velocity vel speed",
  v: "v uy vy u2 v1 vely velocityy vvel vvelocity velocityv",
  w: "w uz vz u3 w1 velz velocityz wvel wvelocity velocityw",
};
const stresses = (a: string, i: string, number: string) =>
  `${a}${a} ${a}'${a}' ${a}'2 ${a}'2mean ${a}${a}mean ${a}prime2 ${a}prime2mean ${a}2mean var${a} ${a}var ` +
  `${a}rms2 r${i}${i} r${a}${a} r${number}${number}`;
const deviations = (a: string) =>
  `${a}rms rms${a} ${a}' ${a}prime ${a}std std${a} sigma${a} \u03c3${a} ${a}'rms ${a}primerms`;
const profile: Spellings = {
  ...places,
  t: time,
  U: "umean meanu uavg ubar ux u1 umean1 u meanvelocity velocity",
  uu: stresses("u", "x", "1"),
  vv: stresses("v", "y", "2"),
  ww: stresses("w", "z", "3"),
  uv: "uv u'v' uvmean rxy ruv r12",
  u_rms: deviations("u"),
  v_rms: deviations("v"),
  w_rms: deviations("w"),
  q: "q k tke kineticenergy turbulentkineticenergy turbulencekineticenergy",
  se: "se qse seq stderr standarderror",
  lambda: "lambda \u03bb lambdag \u03bbg taylorscale taylormicroscale",
  L: "l l11 lint lxx luu integralscale integrallengthscale",
  epsilon: "epsilon eps \u03b5 \u03f5 dissipation dissipationrate",
};
type Spellings = Readonly<Partial<Record<Role, string>>>;

const reduced: readonly Role[] = ["uu", "vv", "ww", "u_rms", "v_rms", "w_rms"];

/**
 * Headings to roles, in the trade's common spellings.
 * Where two columns could be one role, the one whose spelling and case are the trade's own wins (`Zeit` over
 * `T`, which is as often a temperature); where they are alike, neither is taken.
 * @param headings one for each column
 * @param layout   null: recognised as well; a profile is known by stresses, rms values or a decaying quantity
 */
export function recogniseColumns(headings: readonly Heading[], layout: Layout | null): RecognisedColumns {
  if (layout !== null) return assigned(headings, layout);
  const asProfile = assigned(headings, "profile");
  const asSeries = assigned(headings, "series");
  const has = (role: Role) => asProfile.roles.includes(role);
  const energy =
    has("q") && (has("x") || has("t")) && !(asSeries.roles.includes("t") && asSeries.roles.includes("u"));
  return reduced.some(has) || energy ? asProfile : asSeries;
}

function assigned(headings: readonly Heading[], layout: Layout): RecognisedColumns {
  const roles: (Role | null)[] = headings.map(() => null);
  const clashes: { role: Role; columns: number[] }[] = [];
  const written = headings.map(({ name }) => plainName(name));
  const probes = severalProbes(written);
  const names = countedFromOne(written);
  for (const [role, spellings] of Object.entries(layout === "profile" ? profile : series)) {
    const known = spellings.split(" ");
    const ranks = headings.map(({ name }, i) => rank(name, names[i], role, known));
    const best = Math.min(...ranks);
    if (best === Number.POSITIVE_INFINITY) continue;
    const columns = ranks.flatMap((each, i) => (each === best ? [i + 1] : []));
    if (columns.length > 1 || (probes.length > 0 && (role === "u" || role === "v" || role === "w"))) {
      clashes.push({ role: role as Role, columns: columns.length > 1 ? columns : probes });
    } else {
      roles[columns[0] - 1] = role as Role;
    }
  }
  return { layout, roles, clashes };
}

/** 0: the role's own name; then the other spellings in the order of the list, one-letter words in wrong case last. */
function rank(name: string, plain: string, role: string, known: readonly string[]): number {
  if (name === role) return 0;
  const at = known.indexOf(plain);
  if (at < 0) return Number.POSITIVE_INFINITY;
  const folded = plain.length === 1 && name !== plain && name.length === 1;
  return folded ? 100 : 1 + (at === 0 ? 0 : 1);
}

/** Marks of averaging, joints and case taken off: `<u'^2>` and `u'2` are one. */
function plainName(name: string): string {
  return name
    .replace(/[\u2019\u2032\u00b4`]/g, "'")
    .replace(/\u00b2/g, "2")
    .replace(/[<>\u27e8\u27e9{}\\|\s_\-^.:]/g, "")
    .toLowerCase();
}

/** `U:0 U:1 U:2` are components of one vector, as `u1 u2 u3` are: counted from 0, they would be taken one off. */
function countedFromOne(names: readonly string[]): readonly string[] {
  let even = names;
  for (const base of ["u", "umean", "vel", "velocity", "points", "coordinates"]) {
    if (![`${base}0`, `${base}1`].every((name) => names.includes(name)) || names.includes(`${base}3`))
      continue;
    const one = /^[uv]/.test(base) ? "u" : "x";
    even = even.map((name) => [0, 1, 2].reduce((now, i) => (name === base + i ? one + (i + 1) : now), name));
  }
  return even;
}

/** Columns `u1 u2 v1 v2`: several probes side by side, which one role each cannot describe. */
function severalProbes(names: readonly string[]): number[] {
  const numbered = names.flatMap((name, i) => {
    const [, letter] = /^([uvw])\d+$/.exec(name) ?? [];
    return letter === undefined ? [] : [{ letter, column: i + 1 }];
  });
  const letters = new Set(numbered.map(({ letter }) => letter));
  const crowded = numbered.length > letters.size || numbered.length > 3;
  return crowded && (letters.size > 1 || numbered.length > 3) ? numbered.map(({ column }) => column) : [];
}
