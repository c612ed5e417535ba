/** What the results file, the case sheets and the workspace say they were written by. */
export const program = {
  name: "waneline",
  version: "0.1.0",
  /** Raised when a key of the results file is renamed, removed or redefined; adding one is no change. */
  schema: 1,
} as const;
