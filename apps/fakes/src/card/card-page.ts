import type { CheckoutSession } from "./card-store";

const escapes: Record<string, string> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};
const escaped = (text: string): string => text.replace(/[&<>"']/g, (c) => escapes[c] ?? c);

const money = (session: CheckoutSession): string =>
  new Intl.NumberFormat("en-GB", { style: "currency", currency: session.currency }).format(
    session.amount / 100,
  );

const style = `
  :root { color-scheme: light dark; }
  body { font: 18px/28px system-ui, sans-serif; max-width: 34rem; margin: 3rem auto; padding: 0 1.25rem; }
  h1 { font-size: 27px; line-height: 36px; margin: 0 0 .5rem; }
  .sum { font-size: 39px; line-height: 44px; font-variant-numeric: tabular-nums; margin: 1rem 0; }
  .note { border-left: 4px solid; padding-left: 1rem; margin: 1.5rem 0; }
  form { display: flex; gap: 1rem; flex-wrap: wrap; margin: 1.5rem 0; }
  button { font: inherit; padding: .5rem 1.25rem; min-height: 48px; border: 2px solid; border-radius: 2px; cursor: pointer; }
  :focus-visible { outline: 3px solid; outline-offset: 2px; }
  table { border-collapse: collapse; width: 100%; } td, th { text-align: left; padding: .25rem .5rem .25rem 0; border-bottom: 1px solid; }
`;

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><title>${escaped(title)}</title><style>${style}</style></head><body><main>${body}</main></body></html>`;
}

/** The payment page of one session: what is paid, and a button for each way that it can end. */
export function payPage(session: CheckoutSession): string {
  if (session.status !== "open") {
    const what = session.status === "complete" ? "This payment is done." : "This payment page has closed.";
    return page(what, `<h1>${what}</h1><p><a href="${escaped(session.cancelUrl)}">Go back</a></p>`);
  }
  const declined =
    session.declines === 0
      ? ""
      : `<p class="note" role="alert">The card was declined. Try again, or go back and pay another way.</p>`;
  return page(
    `Pay ${money(session)}`,
    `<h1>${escaped(session.description)}</h1><p class="sum">${money(session)}</p>${declined}
    <p class="note">A stand-in for the card company. No card is asked for and no money moves.</p>
    <form method="post"><button name="outcome" value="pay" autofocus>Pay ${money(session)}</button><button name="outcome" value="decline">Decline</button></form>
    <p><a href="${escaped(session.cancelUrl)}">Go back without paying</a></p>`,
  );
}

/** Every session that the stand-in knows, newest first. */
export function sessionsPage(sessions: readonly CheckoutSession[]): string {
  const rows = sessions
    .map(
      (s) =>
        `<tr><td><a href="/card/pay/${s.id}">${escaped(s.description)}</a></td><td>${money(s)}</td><td>${s.status}</td></tr>`,
    )
    .join("");
  const table = `<table><thead><tr><th>For</th><th>Amount</th><th>State</th></tr></thead><tbody>${rows}</tbody></table>`;
  const none = "<p>None yet. Start one with Take payment on an invoice.</p>";
  return page("Card payments", `<h1>Card payments</h1>${sessions.length === 0 ? none : table}`);
}
