import { createContext } from "react";
import type { Quantity } from "../../core/quantity.ts";

/** A number that is asked for: the key of its label, and the very quantity that is shown. */
export interface Asked {
  readonly key: string;
  readonly quantity: Quantity;
}

/** Opens the definition of a number beside it; null where no definitions are to be had. */
export const DefinitionContext = createContext<((asked: Asked, beside: HTMLElement) => void) | null>(null);
