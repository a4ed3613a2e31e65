/**
 * A comparison of ours with the reference in one run. It stands in `NAME.bench.ts` as `export const bench`, its twin in
 * `reference/NAME.py`; `npm run bench -- NAME` runs it alone.
 */
export type Bench = {
  /** What work is compared, as the table's heading. */
  title: string;
  /** Makes the inputs, writes what the twin needs into the folder (it is given the folder as its argument). */
  prepare(folder: string): Promise<Contest>;
};

export type Contest = {
  contenders: Contender[];
  /**
   * Sentences on what the answers do not share, none when they agree.
   * @param ours what the contenders gave, in their order
   * @param reference what the twin's `result()` gave
   */
  differences(ours: unknown[], reference: unknown): string[];
  /** Further findings, to stand below the table: memory, counts. */
  notes?(): Promise<string[]>;
  /** Ends workers and the like. */
  close?(): Promise<void>;
};

export type Contender = {
  name: string;
  /** Most that our median may be of the reference's; null for a figure without a limit. */
  target: number | null;
  run(): unknown;
};

/** A bench without a twin: a table that speaks for itself, rows of cells with a heading first. */
export type TableBench = { title: string; table(): Promise<string[][]>; notes?(): Promise<string[]> };
