import type { Aside } from "../session/session.ts";
import { AsideList } from "./AsideList.tsx";

/** A drop of which nothing could be used: each file by its name and the reason. */
export function FailedState({ aside }: { aside: Aside }) {
  return (
    <div className="row page-top">
      <div />
      <div role="alert">
        <p className="finding serif">Nothing in the drop could be used as a velocity record.</p>
        <AsideList aside={aside} fault />
      </div>
    </div>
  );
}
