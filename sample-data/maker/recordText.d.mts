import type { SynthesisedRecord } from "./synthesise.d.mts";

export function simulatedText(record: SynthesisedRecord, probe: { x: number; step: number }): string;
