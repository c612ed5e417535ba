import { useState } from "react";
import { figureCsv } from "../../export/figureCsv.ts";
import type { FigureTable } from "../../figures/figureSpec.ts";
import { download } from "../page/download.ts";

/** Takes a table along as CSV, with all its digits. */
export function TableSave({ name, table }: { name: string; table: () => FigureTable }) {
  const [failed, setFailed] = useState<string | null>(null);
  const save = () => {
    try {
      download(`waneline-${name}.csv`, figureCsv(table()), "text/csv");
      setFailed(null);
    } catch (error) {
      setFailed(`The table could not be saved: ${error instanceof Error ? error.message : error}.`);
    }
  };
  return (
    <p className="figure-actions table-save">
      <button
        type="button"
        className="action"
        aria-label={`Table of ${name.replaceAll("-", " ")} as CSV`}
        onClick={save}
      >
        CSV
      </button>
      {failed !== null && <span role="alert">{failed}</span>}
    </p>
  );
}
