import type * as v from "valibot";

/** As much of a schema as this walk looks at. */
interface Schema {
  readonly type: string;
  readonly entries?: v.ObjectEntries;
  readonly wrapped?: Schema;
  readonly item?: Schema;
  readonly pipe?: readonly Schema[];
  readonly options?: readonly Schema[];
}

/**
 * The keys of a value that its schema does not know, as `fit.windw`, in the order they stand.
 * @param schema what was expected
 * @param value  what was found, valid by the schema
 */
export function unknownKeys(schema: unknown, value: unknown, path = ""): string[] {
  const { type, entries, wrapped, item, options, pipe } = schema as Schema;
  if (value === null || typeof value !== "object") return [];
  if (wrapped) return unknownKeys(wrapped, value, path);
  if (pipe)
    return pipe
      .slice(type === "custom" ? 1 : 0)
      .flatMap((step) => unknownKeys(withoutPipe(step), value, path));
  if (type === "array" && item && Array.isArray(value)) {
    return value.flatMap((each, i) => unknownKeys(item, each, `${path}[${i}]`));
  }
  if (type === "union" && options && !Array.isArray(value)) {
    const object = options.find((option) => option.type === "object");
    return object ? unknownKeys(object, value, path) : [];
  }
  if (!entries) return [];
  return Object.entries(value).flatMap(([key, inner]) => {
    const name = path === "" ? key : `${path}.${key}`;
    return Object.hasOwn(entries, key) ? unknownKeys(entries[key], inner, name) : [name];
  });
}

/** The first step of a pipe carries the whole pipe with it. */
function withoutPipe(step: Schema): Omit<Schema, "pipe"> {
  const { pipe: _pipe, ...rest } = step;
  return rest;
}
