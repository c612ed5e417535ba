import { createContext } from "react";
import type { Quantity } from "../../core/quantity.ts";
import type { FoundNumber } from "./foundNumber.ts";

/** A number that is asked for: the key of its label, and the very quantity that is shown. */
export interface Asked {
  readonly key: string;
  readonly quantity: Quantity;
  /** Where it comes from, for a number that no result holds as it is shown. */
  readonly at?: FoundNumber | undefined;
}

export type OpenDefinition = (asked: Asked, beside: HTMLElement) => void;

/** Opens the definition of a number beside it; null where no definitions are to be had. */
export const DefinitionContext = createContext<OpenDefinition | null>(null);

/** Where the panel leaves what opens it, for numbers that stand outside of it: the readings in the head. */
export const DefinitionDoor = createContext<{ current: OpenDefinition | null } | null>(null);
