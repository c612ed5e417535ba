import type { Run } from "../../core/catalogue.ts";

/** A symbol from its runs: italic STIX, descriptive parts upright, indices lowered. */
export function SymbolText({ runs }: { runs: readonly Run[] }) {
  return (
    <span className="sym">
      {runs.map((run, i) => {
        const body = run.upright ? <span className="up">{run.text}</span> : run.text;
        // biome-ignore lint/suspicious/noArrayIndexKey: the runs of a symbol never move
        return run.place === undefined ? <span key={i}>{body}</span> : <Raised key={i} run={run} />;
      })}
    </span>
  );
}

function Raised({ run }: { run: Run }) {
  const Place = run.place ?? "sub";
  return <Place>{run.upright ? <span className="up">{run.text}</span> : run.text}</Place>;
}
