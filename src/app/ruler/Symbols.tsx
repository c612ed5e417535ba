/** x or t, in italics. */
export function PlaceSymbol({ along }: { along: "x" | "t" }) {
  return <span className="sym">{along}</span>;
}

/** x0 or t0: the virtual origin. */
export function OriginSymbol({ along }: { along: "x" | "t" }) {
  return (
    <span className="sym">
      {along}
      <sub>
        <span className="up">0</span>
      </sub>
    </span>
  );
}
