import { formatPosition, withUnit } from "../../figures/formatNumber.ts";
import { CaseMark } from "./CaseMark.tsx";
import type { FlagGroup } from "./flagGroups.ts";
import { Pennant } from "./Pennant.tsx";
import { RichText } from "./RichText.tsx";

/** So many doubts are read beside the sentence; the others wait in a fold. */
const shownAtOnce = 4;

/** The doubts: a pennant, the place, the fact and its consequence. */
export function FlagNotes({ groups, unit }: { groups: readonly FlagGroup[]; unit: string }) {
  const [first, others] = [groups.slice(0, shownAtOnce), groups.slice(shownAtOnce)];
  return (
    <>
      {first.map((group) => (
        <FlagNote group={group} unit={unit} key={group.key} />
      ))}
      {others.length > 0 && (
        <details className="more-flags">
          <summary className="action">{others.length} more</summary>
          {others.map((group) => (
            <FlagNote group={group} unit={unit} key={group.key} />
          ))}
        </details>
      )}
    </>
  );
}

function FlagNote({ group, unit }: { group: FlagGroup; unit: string }) {
  const { mark, name, xs, text, alike } = group;
  return (
    <p className="flag-note">
      <Pennant />
      <span>
        <CaseMark mark={mark} /> {name}
        {xs.length > 0 && (
          <>
            , <i className="sym">x</i> = {withUnit(placesText(xs), unit)}
          </>
        )}
        {xs.length > 3 && ` (${xs.length} stations)`}: <RichText text={text} />
        {!alike && ` So at ${withUnit(formatPosition(xs[0]), unit)}; each station has its own figure.`}
      </span>
    </p>
  );
}

function placesText(xs: readonly number[]): string {
  const texts = xs.map((x) => formatPosition(x));
  return texts.length <= 3 ? texts.join(", ") : `${texts[0]} to ${texts[texts.length - 1]}`;
}
