/** How the money can reach the practice, with the reference that must come with it. On paper and on the screen. */
export function howToPay(invoice: { readonly reference: string | null; readonly phone: string }): string {
  const quote = invoice.reference === null ? "" : ` Give the reference ${invoice.reference}.`;
  return `At the desk by card or cash, or by bank: ring ${invoice.phone} for the account.${quote}`;
}
