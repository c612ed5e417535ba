import { useState } from "react";
import { labelOf } from "../../core/catalogue.ts";
import { unitOf } from "../../core/unitText.ts";
import type { CaseSheet } from "../../sheet/caseSheet.ts";
import type { ReductionEdit } from "../../sheet/changeReduction.ts";
import type { WorkspaceChange } from "../../sheet/workspace.ts";
import type { CaseView } from "../session/caseView.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { CommonChoice } from "./CommonChoice.tsx";
import { CommonNumber } from "./CommonNumber.tsx";
import { dissipations, kinds, probesTaken, stamps, yesNo } from "./reductionRows.ts";
import { StartUpField } from "./StartUpField.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { integralRoutes } from "./stationSettings.ts";

const everyCase = "every case";
const correlations = { biased: "biased, 1/N", unbiased: "unbiased, 1/(N − lag)" } as const;
const detrends = { mean: "record mean", linear: "linear trend" } as const;
const corrected = { true: "corrected", false: "not corrected" } as const;
const shortest = 6;
const longest = 17;

/** The controls of the reduction, for one case or for every one alike; a change is used at once and can be taken back. */
export function ReductionForm({
  cases,
  onChange,
}: {
  cases: readonly CaseView[];
  onChange: (change: WorkspaceChange) => void;
}) {
  const [chosen, choose] = useState(everyCase);
  const scope = cases.length === 1 ? cases : cases.filter(({ id }) => chosen === everyCase || id === chosen);
  const shown = scope.length === 0 ? cases : scope;
  const edit = (change: ReductionEdit) =>
    onChange({ kind: "set-reduction", caseId: shown.length === 1 ? shown[0].id : null, edit: change });
  return (
    <div className="choices-form reduction-form">
      {cases.length > 1 && (
        <ChoiceField
          label="change it in"
          value={scope.length === 0 ? everyCase : chosen}
          choices={{ [everyCase]: everyCase, ...Object.fromEntries(cases.map(({ id, name }) => [id, name])) }}
          onChange={choose}
        />
      )}
      <Fields cases={shown} sheets={shown.map((view) => view.of.sheet)} edit={edit} key={chosen} />
    </div>
  );
}

interface FieldsProps {
  readonly cases: readonly CaseView[];
  readonly sheets: readonly CaseSheet[];
  readonly edit: (edit: ReductionEdit) => void;
}

function Fields({ cases, sheets, edit }: FieldsProps) {
  const unit = unitOf("L", sheets[0].units);
  const records = sheets.filter(({ layout }) => layout !== "profile");
  const series = sheets.filter(({ layout }) => layout === "series");
  const lines = sheets.filter(({ layout }) => layout === "lines");
  return (
    <>
      <CommonChoice
        label="kind of data"
        choices={kinds}
        of={(sheet) => sheet.kind ?? "none"}
        sheets={sheets}
        onChange={(kind) => edit({ kind: kind === "none" ? null : kind })}
      />
      {records.length > 0 && (
        <>
          <StartUpField
            cases={cases.filter((view) => view.of.sheet.layout !== "profile")}
            onChange={(startup) => edit({ startup })}
          />
          <CommonChoice
            label={
              <>
                integral scale <SymbolText runs={labelOf("T_int").symbol} />
              </>
            }
            choices={integralRoutes}
            of={({ reduce }) => reduce.integralScale}
            sheets={records}
            onChange={(integralScale) => edit({ reduce: { integralScale } })}
          />
        </>
      )}
      {series.length > 0 && <SeriesFields sheets={series} edit={edit} />}
      {lines.length > 0 && (
        <CommonChoice
          label="lines close on themselves"
          choices={yesNo}
          of={({ periodic }) => `${periodic}`}
          sheets={lines}
          onChange={(periodic) => edit({ periodic: asAnswer(periodic) })}
        />
      )}
      <CommonChoice
        label={
          <>
            dissipation <i className="sym">ε</i>
          </>
        }
        choices={dissipations}
        of={({ reduce }) => reduce.dissipation}
        sheets={sheets}
        onChange={(dissipation) => edit({ reduce: { dissipation } })}
      />
      <CommonChoice
        label="stations sampled together"
        choices={yesNo}
        of={({ simultaneous }) => `${simultaneous}`}
        sheets={sheets}
        onChange={(simultaneous) => edit({ simultaneous: asAnswer(simultaneous) })}
      />
      <CommonNumber
        label="length of the sensor"
        unit={unit}
        above={0}
        of={({ sensorLength }) => sensorLength}
        sheets={sheets}
        onChange={(sensorLength) => edit({ sensorLength })}
      />
      <CommonNumber
        label="lateral size of the domain"
        unit={unit}
        above={0}
        of={({ extent }) => extent}
        sheets={sheets}
        onChange={(extent) => edit({ extent })}
      />
      <CommonNumber
        label={
          <>
            <i className="sym">x</i> of grid or inflow in the files
          </>
        }
        unit={unit}
        of={({ zero }) => zero}
        sheets={sheets}
        onChange={(zero) => edit({ zero: zero ?? 0 })}
      />
    </>
  );
}

function SeriesFields({ sheets, edit }: Pick<FieldsProps, "sheets" | "edit">) {
  const sizes = Array.from({ length: longest - shortest + 1 }, (_, i) => 2 ** (shortest + i));
  const given = sheets.flatMap(({ reduce }) => reduce.segment ?? []);
  const segments = [...new Set([...sizes, ...given])].sort((a, b) => a - b);
  return (
    <>
      <CommonChoice
        label="correlation"
        choices={correlations}
        of={({ reduce }) => reduce.correlation}
        sheets={sheets}
        onChange={(correlation) => edit({ reduce: { correlation } })}
      />
      <CommonChoice
        label="removed from a record"
        choices={detrends}
        of={({ reduce }) => reduce.detrend}
        sheets={sheets}
        onChange={(detrend) => edit({ reduce: { detrend } })}
      />
      <CommonChoice
        label="samples in a segment"
        choices={Object.fromEntries([
          ["auto", "from the integral time"],
          ...segments.map((size) => [`2^${Math.log2(size)}`, String(size)]),
        ])}
        of={({ reduce }) => (reduce.segment === null ? "auto" : `2^${Math.log2(reduce.segment)}`)}
        sheets={sheets}
        onChange={(size) =>
          edit({ reduce: { segment: size === "auto" ? null : 2 ** Number(size.slice(2)) } })
        }
      />
      <CommonChoice
        label="probes at one position that count"
        choices={probesTaken}
        of={({ reduce }) => reduce.probes}
        sheets={sheets}
        onChange={(probes) => edit({ reduce: { probes } })}
      />
      <CommonChoice
        label="rounded time stamps"
        choices={stamps}
        of={({ read }) => read.times}
        sheets={sheets}
        onChange={(times) => edit({ read: { times } })}
      />
      <CommonChoice
        label="Taylor’s hypothesis"
        choices={corrected}
        of={({ reduce }) => `${reduce.taylorCorrection}`}
        sheets={sheets}
        onChange={(yes) => edit({ reduce: { taylorCorrection: yes === "true" } })}
      />
    </>
  );
}

const asAnswer = (key: keyof typeof yesNo) => (key === "auto" ? "auto" : key === "true");
