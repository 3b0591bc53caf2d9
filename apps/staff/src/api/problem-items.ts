/** One line of an error summary; with an id it links to that field. */
export interface ErrorSummaryItem {
  id?: string;
  message: string;
}
