/** One line of what a benchmark measured. */
export interface BenchRow {
  readonly name: string;
  /** The figure with its unit, as it is to be read. */
  readonly figure: string;
  /** The figure over what it is compared with in the same run; null where nothing is compared. */
  readonly ratio: number | null;
  readonly note: string;
}
