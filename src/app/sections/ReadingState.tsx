import { formatCount } from "../../figures/formatNumber.ts";
import type { Offer, Work } from "../session/session.ts";
import { bytesText } from "./bytesText.ts";

/** The first look at a drop: how many files, how much. */
export function LookingState({ offer }: { offer: Offer }) {
  return (
    <>
      <p className="finding serif" role="status">
        <strong>
          {offer.looked} of {formatCount(offer.files)} files
        </strong>{" "}
        are looked at, {bytesText(offer.bytes, offer.bytes)} in all.
      </p>
      <Ticks done={offer.looked} of={offer.files} />
    </>
  );
}

/** Records on their way to stations: one tick a file, open until it is in. */
export function ReducingState({ work, onCancel }: { work: readonly Work[]; onCancel: () => void }) {
  const sum = (of: (each: Work) => number) => work.reduce((total, each) => total + of(each), 0);
  const [files, done] = [sum((each) => each.files), sum((each) => each.filesDone)];
  const [bytes, read] = [sum((each) => each.bytes), sum((each) => each.bytesDone)];
  return (
    <div className="reducing">
      <p className="finding serif">
        {formatCount(done)} of <strong>{formatCount(files)} files</strong> are reduced,{" "}
        {bytesText(read, bytes)}. The law of a case follows when its last file is in.
      </p>
      <div className="progress">
        <Ticks done={done} of={files} />
        <button type="button" className="action" onClick={onCancel}>
          {done === 0 ? "Cancel" : `Cancel, keep the ${formatCount(done)}`}
        </button>
      </div>
    </div>
  );
}

/** No more ticks than a line or two holds: above that, a tick stands for several files. */
const mostTicks = 120;

function Ticks({ done, of }: { done: number; of: number }) {
  const count = Math.min(of, mostTicks);
  const full = Math.floor((done / Math.max(of, 1)) * count);
  return (
    <div
      className="progress-ticks"
      role="progressbar"
      aria-valuemin={0}
      aria-valuemax={of}
      aria-valuenow={done}
      aria-label="Files"
    >
      {Array.from({ length: count }, (_, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a tick is its place
        <i key={i} className={i < full ? "done" : undefined} />
      ))}
    </div>
  );
}
