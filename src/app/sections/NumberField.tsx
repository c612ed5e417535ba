import { type ReactNode, useId, useState } from "react";

/**
 * A number to type: it counts when the field is left or Enter is pressed, never while half a number stands there.
 * An empty field means "none"; what is no number is said and changes nothing.
 */
export function NumberField({
  label,
  value,
  unit = "",
  above,
  least,
  open = false,
  placeholder,
  onChange,
}: {
  label: ReactNode;
  value: number | null;
  unit?: string;
  /** The number must be above this. */
  above?: number;
  /** The number must be this or more. */
  least?: number;
  /** True where the page asks for it. */
  open?: boolean;
  placeholder?: string;
  onChange: (value: number | null) => void;
}) {
  const id = useId();
  const [text, setText] = useState<string | null>(null);
  const shown = text ?? (value === null ? "" : String(value));
  const parsed = parseNumber(shown);
  const tooSmall =
    typeof parsed === "number" &&
    ((above !== undefined && parsed <= above) || (least !== undefined && parsed < least));
  const wrong = parsed === "wrong" || tooSmall;
  const settle = () => {
    if (text === null || parsed === "wrong" || wrong) return;
    setText(null);
    if (parsed !== value) onChange(parsed);
  };
  return (
    <div className="field" data-open={open && value === null && text === null}>
      <label htmlFor={id}>
        {label}
        {unit !== "" && ` (${unit})`}
      </label>
      <input
        id={id}
        inputMode="decimal"
        autoComplete="off"
        value={shown}
        placeholder={placeholder}
        aria-invalid={wrong}
        onChange={(event) => setText(event.target.value)}
        onBlur={settle}
        onKeyDown={(event) => {
          if (event.key === "Enter") settle();
          if (event.key === "Escape") setText(null);
        }}
      />
      {wrong && (
        <span role="alert">
          {parsed === "wrong"
            ? "A plain number, such as 0.5 or 1.5e-5, is needed."
            : least === 0
              ? "Zero or a number above it is needed."
              : `A number above ${above === 0 ? "zero" : above} is needed.`}
        </span>
      )}
    </div>
  );
}

/** No length, speed, viscosity or intensity lies beyond these: a slip of the exponent must not stretch the axes. */
const [smallest, largest] = [1e-12, 1e9];

/** Decimal point or comma, powers of ten as 1.5e-5; null: nothing typed; beyond any quantity of a tunnel: wrong. */
export function parseNumber(text: string): number | null | "wrong" {
  const plain = text.trim().replace("−", "-").replace(",", ".");
  if (plain === "") return null;
  const value = Number(plain);
  const size = Math.abs(value);
  return value === 0 || (size >= smallest && size <= largest) ? value : "wrong";
}
