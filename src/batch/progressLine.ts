/** How far the work is, for a terminal. */
export interface ProgressLine {
  /** More work is known of. */
  expect(files: number, bytes: number): void;
  read(bytes: number): void;
  fileDone(): void;
}

/** A line a second says enough and keeps the log of a long run short. */
const shortestPause = 1000;

/**
 * Tells how many files and bytes have been read, at most once a second and once at the end.
 * @param write takes one line
 * @param now   milliseconds of any clock that only goes on
 */
export function progressLine(write: (line: string) => void, now: () => number): ProgressLine {
  let [files, filesDone, bytes, bytesDone] = [0, 0, 0, 0];
  let told = now();

  function tell() {
    const complete = filesDone === files;
    if (!complete && now() - told < shortestPause) return;
    told = now();
    // a file that failed leaves bytes unread: the end is told by the files
    const share = bytes === 0 || complete ? 100 : Math.min(99, Math.floor((100 * bytesDone) / bytes));
    write(`${filesDone} of ${files} files done, ${share} % of ${megabytes(bytes)} MB`);
  }
  return {
    expect(moreFiles, moreBytes) {
      files += moreFiles;
      bytes += moreBytes;
    },
    read(more) {
      bytesDone += more;
      tell();
    },
    fileDone() {
      filesDone += 1;
      tell();
    },
  };
}

function megabytes(bytes: number): string {
  return (bytes / 1e6).toFixed(bytes < 1e7 ? 1 : 0);
}
