import type { MethodsPart } from "../methodsText.ts";
import type { MethodsCase } from "./methodsCase.ts";

/** What the reader must not take as tested, since the data could not tell it. */
export function untestedMethods(cases: readonly MethodsCase[]): MethodsPart {
  const named = (test: (one: MethodsCase) => boolean) =>
    cases
      .filter(test)
      .map(({ name }) => name)
      .join(" and ");
  const lacks = (component: "v" | "w") => (one: MethodsCase) =>
    one.settings.layout !== "profile" &&
    one.stations.length > 0 &&
    one.stations.every(({ facts }) => !facts.components.includes(component));
  const alone = named((one) => lacks("v")(one) && lacks("w")(one));
  const withoutW = named((one) => lacks("w")(one) && !lacks("v")(one));
  const short = named((one) =>
    one.stations.some(({ flags }) => flags.some(({ code }) => code === "short-record")),
  );
  const given = named(({ settings }) => settings.layout === "profile");
  const sentences = [
    alone === "" ? "" : `Isotropy was assumed and not tested in ${alone}, where u alone was recorded.`,
    withoutW === "" ? "" : `In ${withoutW} w was not recorded and was taken like v.`,
    given === ""
      ? ""
      : `Records, stationarity and sampling of ${given} could not be checked: only statistics were given.`,
    short === "" ? "" : `Records of ${short} that are shorter than 100 integral times carry no interval.`,
  ].filter((sentence) => sentence !== "");
  return { text: sentences.length === 0 ? "" : `Not tested: ${sentences.join(" ")}`, sources: [] };
}
