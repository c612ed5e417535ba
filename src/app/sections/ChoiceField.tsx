import { type ReactNode, useId } from "react";

/** One choice among a few words. */
export function ChoiceField<T extends string>({
  label,
  value,
  choices,
  onChange,
}: {
  label: ReactNode;
  /** Null where several cases are meant and differ. */
  value: T | null;
  choices: Readonly<Record<T, string>>;
  onChange: (value: T) => void;
}) {
  const id = useId();
  const keys = Object.keys(choices) as T[]; // the record's own keys, which TypeScript widens to string
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <select
        id={id}
        value={value ?? ""}
        onChange={(event) => {
          const chosen = keys.find((key) => key === event.target.value);
          if (chosen !== undefined) onChange(chosen);
        }}
      >
        {value === null && (
          <option value="" disabled>
            they differ
          </option>
        )}
        {keys.map((key) => (
          <option value={key} key={key}>
            {choices[key]}
          </option>
        ))}
      </select>
    </div>
  );
}
