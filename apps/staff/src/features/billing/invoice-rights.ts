/** What this person may do with the invoice on the screen. */
export interface InvoiceRights {
  draft: boolean;
  issue: boolean;
  takePayment: boolean;
  refund: boolean;
}
