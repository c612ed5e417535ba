import { program } from "../../core/program.ts";
import { formatCount } from "../../figures/formatNumber.ts";
import type { CaseView } from "../session/caseView.ts";
import { bytesText } from "./bytesText.ts";

/** The last line: which program, and what it was given. */
export function PageFoot({ cases }: { cases: readonly CaseView[] }) {
  const sources = cases.flatMap((view) => view.of.sources);
  const bytes = sources.reduce((sum, source) => sum + source.bytes, 0);
  return (
    <footer className="row page-foot">
      <div />
      <p>
        Waneline {program.version}; {formatCount(sources.length)} files, {bytesText(bytes, bytes)}. They stay
        on this machine: they are read here, and the page asks nothing of any other server.
      </p>
    </footer>
  );
}
