import { useEffect, useRef } from "react";

interface BodyFieldProps {
  readonly px: number;
  /** It ends there instead of beginning there. */
  readonly before: boolean;
  readonly x: number;
  readonly name: string;
  /** Null: left as it was. */
  readonly onDone: (x: number | null) => void;
}

/** The body's position as a number to type, in place of its name. What is no number changes nothing. */
export function BodyField({ px, before, x, name, onDone }: BodyFieldProps) {
  const ended = useRef(false);
  const field = useRef<HTMLInputElement>(null);
  // once, when it comes: what is being typed would be selected, and replaced, whenever the page draws anew
  useEffect(() => {
    field.current?.focus();
    field.current?.select();
  }, []);
  const end = (text: string) => {
    if (ended.current) return;
    ended.current = true;
    const number =
      text.trim() === "" ? Number.NaN : Number(text.trim().replace(",", ".").replace("\u2212", "-"));
    onDone(Number.isFinite(number) ? number : null);
  };
  return (
    <input
      className={`ruler-body-field${before ? " before" : ""}`}
      style={{ left: px }}
      aria-label={`Position of ${name}`}
      inputMode="decimal"
      defaultValue={x}
      ref={field}
      onBlur={(event) => end(event.currentTarget.value)}
      onKeyDown={(event) => {
        if (event.key === "Enter") end(event.currentTarget.value);
        if (event.key === "Escape") end("");
      }}
    />
  );
}
