import type { Preview } from "../../core/records.ts";
import { formatCount, formatPosition } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { Fold } from "./Fold.tsx";
import { TableScroll } from "./TableScroll.tsx";

const origins = {
  sheet: "case sheet",
  column: "x column",
  comment: "comment line",
  name: "file name",
  hand: "typed here",
} as const;

/** Every file: what its columns were taken as, where it stands and how that is known. */
export function FilesFold({ cases, previews }: { cases: readonly CaseView[]; previews: readonly Preview[] }) {
  const count = cases.reduce((sum, view) => sum + view.of.sources.length, 0);
  const byName = new Map(previews.map((preview) => [preview.file, preview]));
  return (
    <Fold name="Files, columns, units, positions" fact={`${formatCount(count)} files`}>
      <TableScroll label="Files">
        <table className="data">
          <thead>
            <tr>
              <th scope="col">File</th>
              <th scope="col" className="text">
                Columns
              </th>
              <th scope="col">Lines, about</th>
              <th scope="col">
                <i className="sym">x</i>
              </th>
              <th scope="col" className="text">
                Position from
              </th>
            </tr>
          </thead>
          <tbody>
            {cases.flatMap((view) =>
              view.of.sources.map((source) => (
                <FileRow
                  key={view.id + source.name}
                  name={source.name}
                  view={view}
                  preview={byName.get(source.name)}
                />
              )),
            )}
          </tbody>
        </table>
      </TableScroll>
    </Fold>
  );
}

function FileRow({ name, view, preview }: { name: string; view: CaseView; preview: Preview | undefined }) {
  const notes = (view.reduced?.sources ?? []).filter((source) => source.name === name);
  const xs = [...new Set(notes.map((note) => note.x).filter((x) => x !== null))];
  const position = notes[0]?.position ?? null;
  return (
    <tr>
      <td>
        <span className="well">{name}</span>
      </td>
      <td className="text wrap">{preview ? columnsText(preview) : "–"}</td>
      <td>{preview ? formatCount(Number(preview.estimatedRows.toPrecision(3))) : "–"}</td>
      <td>{xs.length === 0 ? "–" : xs.length === 1 ? formatPosition(xs[0]) : `${xs.length} positions`}</td>
      <td className="text">{position === null ? "–" : origins[position]}</td>
    </tr>
  );
}

/** "t (s), u (m/s), v (m/s); T not used" */
function columnsText({ columns }: Preview): string {
  const used = columns.filter((column) => column.role !== null);
  const unused = columns.filter((column) => column.role === null);
  const text = ({ heading, number }: (typeof columns)[number]) => heading || `column ${number}`;
  const taken = used.map((column) => {
    const unit = column.unit === null ? "" : ` (${column.unit})`;
    const name = text(column);
    return name === column.role ? name + unit : `${name}${unit} as ${column.role}`;
  });
  return taken.join(", ") + (unused.length > 0 ? `; not used: ${unused.map(text).join(", ")}` : "");
}
