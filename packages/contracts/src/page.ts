/** One page of a list that the server pages. */
export interface Page<T> {
  readonly rows: readonly T[];
  readonly page: number;
  readonly pageSize: number;
  /** Rows in the whole filter, not in the page. */
  readonly total: number;
}
