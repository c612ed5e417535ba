import { atBody } from "../../core/decay/atBody.ts";
import { developmentLength } from "../../core/decay/developmentLength.ts";
import type { DecayArgument } from "../../core/decayArgument.ts";
import type { DecayResult, DecaySettings } from "../../core/decayResult.ts";
import type { ArguedCase } from "./session.ts";

const kept = new WeakMap<DecayResult, { readonly asked: string; readonly made: ArguedCase }>();

/**
 * An argued case with the body and the tolerance of development that the settings ask for now. Neither changes the fit,
 * and both take a few milliseconds, so the worker is not asked: a body that is moved leaves every other number alone.
 */
export function withBody(argued: ArguedCase, settings: DecaySettings): ArguedCase {
  const { argument } = argued.decay;
  if (argument === undefined) return argued;
  const asked = JSON.stringify([settings.body, settings.developmentTolerance]);
  const known = kept.get(argued.decay);
  if (known?.asked === asked) return known.made;
  const made = answered(argued, argument, settings);
  kept.set(argued.decay, { asked, made });
  return made;
}

function answered(argued: ArguedCase, argument: DecayArgument, settings: DecaySettings): ArguedCase {
  const { stations, decay } = argued;
  const fresh = { body: isBody(argument, settings), development: isTolerance(argument, settings) };
  if (fresh.body && fresh.development) return argued;
  const placed = () => (settings.body ? atBody(stations, decay, settings, settings.body) : null);
  return {
    stations,
    decay: {
      ...decay,
      argument: {
        ...argument,
        body: fresh.body ? argument.body : placed(),
        development: fresh.development ? argument.development : developmentLength(stations, decay, settings),
      },
    },
  };
}

/** Whether the argument is about the body that is asked for. */
function isBody({ body }: DecayArgument, settings: DecaySettings): boolean {
  const asked = settings.body ?? null;
  if (body === null || asked === null) return body === asked;
  const { Tu, L11_chord } = body.targets;
  return (
    body.x === asked.x &&
    body.chord === asked.chord &&
    (Tu?.target ?? null) === asked.Tu &&
    (L11_chord?.target ?? null) === asked.L11
  );
}

function isTolerance({ development }: DecayArgument, settings: DecaySettings): boolean {
  return (
    settings.developmentTolerance === undefined || development.tolerance === settings.developmentTolerance
  );
}
