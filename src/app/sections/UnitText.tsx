const superscripts: Readonly<Record<string, string>> = { "²": "2", "³": "3" };

/** A unit in the interface's face; its powers are raised figures, not the small signs of the font. */
export function UnitText({ unit }: { unit: string }) {
  return (
    <span className="unit">
      {[...unit].map((sign, i) =>
        // biome-ignore lint/suspicious/noArrayIndexKey: the signs of a unit never move
        sign in superscripts ? <sup key={i}>{superscripts[sign]}</sup> : sign,
      )}
    </span>
  );
}
