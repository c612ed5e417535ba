import type { Run } from "../../core/catalogue.ts";

/** A symbol from its runs: italic STIX, descriptive parts upright, indices lowered. */
export function SymbolText({ runs }: { runs: readonly Run[] }) {
  return (
    <span className="sym">
      {runs.map((run, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: the runs of a symbol never move
        <RunText run={run} key={i} />
      ))}
    </span>
  );
}

function RunText({ run }: { run: Run }) {
  const Place = run.place ?? "span";
  return <Place>{run.upright ? <span className="up">{run.text}</span> : run.text}</Place>;
}
