/**
 * A place at which a record is not read on as it stands: where time runs back, where samples are lacking, or where
 * one was sent twice. Times are those of the file.
 */
export interface RecordCut {
  readonly file: string;
  /** Place of the probe across the stream; null where it is not known. */
  readonly y: number | null;
  readonly z: number | null;
  /** Sample with which the record goes on, counted from 1 over those of the probe in the file after its start-up. */
  readonly at: number;
  /**
   * backward: the older run is left out from `to` on, where the newer one begins · gap: nothing is correlated across
   * · missing: samples without a value · repeated: two samples under one time, of which the newer one is kept.
   */
  readonly kind: "backward" | "gap" | "missing" | "repeated";
  /** Time of the last sample before the cut, s. */
  readonly from: number;
  /** Time of the sample at which the record goes on, s. */
  readonly to: number;
  /** Samples left out, or lacking by the record's own step. */
  readonly samples: number;
}
