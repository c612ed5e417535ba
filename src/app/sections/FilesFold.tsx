import { bare } from "../../core/quantity.ts";
import type { Preview } from "../../core/records.ts";
import { formatCount, formatPosition } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { Definition } from "./Definition.tsx";
import { Fold } from "./Fold.tsx";
import { NumberButton } from "./NumberButton.tsx";
import { origins } from "./stationSettings.ts";
import { TableScroll } from "./TableScroll.tsx";

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
              <th scope="col">
                <Definition of="fileLines">Lines, about</Definition>
              </th>
              <th scope="col">
                <Definition of="x">
                  <i className="sym">x</i>
                </Definition>
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
      <td>{preview ? <Lines view={view} preview={preview} /> : "–"}</td>
      <td>{xs.length === 0 ? "–" : <Places view={view} name={name} xs={xs} position={position} />}</td>
      <td className="text">{position === null ? "–" : origins[position]}</td>
    </tr>
  );
}

function Lines({ view, preview }: { view: CaseView; preview: Preview }) {
  const shown = formatCount(Number(preview.estimatedRows.toPrecision(3)));
  const rows = [
    ["file", preview.file],
    ["bytes", formatCount(preview.bytes)],
  ] as const;
  return (
    <NumberButton
      of="fileLines"
      quantity={bare(preview.estimatedRows, "an estimate of its own")}
      at={{ kind: "page", view, shown, rows }}
    >
      {shown}
    </NumberButton>
  );
}

function Places({
  view,
  name,
  xs,
  position,
}: {
  view: CaseView;
  name: string;
  xs: readonly number[];
  position: keyof typeof origins | null;
}) {
  const shown = xs.length === 1 ? formatPosition(xs[0]) : `${xs.length} positions`;
  const { zero } = view.of.sheet;
  const rows = [
    ["file", name],
    ["from", position === null ? "not known" : origins[position]],
    ["subtracted", zero === 0 ? "nothing" : formatPosition(zero)],
  ] as const;
  return (
    <NumberButton of="x" quantity={bare(xs[0], "as it was told")} at={{ kind: "page", view, shown, rows }}>
      {shown}
    </NumberButton>
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
