import { use, useMemo } from "react";
import { RestedCases } from "../page/restedCases.ts";
import { DrawnFold } from "./DrawnFold.tsx";
import { limitColumns, lineColumns, recordColumns } from "./factColumns.ts";
import { LinesNote } from "./LinesNote.tsx";
import { StationRoutes } from "./StationRoutes.tsx";

/** How every record was reduced: lengths, groups, segments, cut-offs and corrections as they worked out. */
export function ReductionFold() {
  const rested = use(RestedCases);
  const cases = useMemo(
    () => rested.filter((view) => view.stations.some(({ duration }) => duration !== null)),
    [rested],
  );
  if (cases.length === 0) return null;
  const stations = cases.reduce((sum, view) => sum + view.stations.length, 0);
  return (
    <DrawnFold name="How records were reduced" fact={`${stations} stations`}>
      {() => (
        <>
          <LinesNote cases={cases} />
          <StationRoutes label="Lengths, groups and segments" cases={cases} columns={recordColumns} />
          <StationRoutes label="Limits and corrections" cases={cases} columns={limitColumns} />
          <StationRoutes label="Lines" cases={cases} columns={lineColumns} />
        </>
      )}
    </DrawnFold>
  );
}
