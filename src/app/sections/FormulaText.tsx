import { RichText } from "./RichText.tsx";

/** A symbol with an index, written on one line: λ_g, D_LLL, b_ij; also x0 and a power, ^(1/4). */
const indexed = /([A-Za-zλεηρτδ]+)_([A-Za-zλε0-9]+)|\^\(([^)]+)\)|\b(x)(0)\b/g;

/** A definition of the catalogue with its indices lowered and its powers raised. */
export function FormulaText({ text }: { text: string }) {
  const parts = [];
  let from = 0;
  for (const match of text.matchAll(indexed)) {
    const [whole, base, index, power, origin, zero] = match;
    parts.push(<RichText text={text.slice(from, match.index)} key={`t${match.index}`} />);
    from = match.index + whole.length;
    parts.push(
      power === undefined ? (
        <span className="sym" key={match.index}>
          {base ?? origin}
          <sub className={/^[a-z]$|^LL|^ij|^jk|^ki|^[λε]$/.test(index ?? "") ? undefined : "up"}>
            {index ?? zero}
          </sub>
        </span>
      ) : (
        <sup key={match.index}>{power}</sup>
      ),
    );
  }
  return [...parts, <RichText text={text.slice(from)} key="end" />];
}
