import type { CaughtMail } from "./mail-store";

const entities: Record<string, string> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};
export const escaped = (text: string): string => text.replace(/[&<>"']/g, (c) => entities[c] ?? c);

const style = `
  :root { color-scheme: light dark; --paper: #F6F2E7; --sheet: #FFFDF7; --ink: #1F2724; --soft: #55605A; --rule: #857E6B; --hair: #DDD6C4; --link: #7A2E1D; --margin: #C98A7C; --focus: #8A3B12; }
  @media (prefers-color-scheme: dark) { :root { --paper: #171C1A; --sheet: #212826; --ink: #EDE8DA; --soft: #B3B9AF; --rule: #6F7A73; --hair: #37403C; --link: #F0B39F; --margin: #7A4A40; --focus: #F2B84B; } }
  * { box-sizing: border-box; }
  body { margin: 0; background: var(--paper); color: var(--ink); font: 15px/22px "Atkinson Hyperlegible Next", system-ui, sans-serif; }
  main { max-width: 1040px; min-height: 100vh; margin-left: clamp(16px, 8vw, 136px); padding: 24px 20px 64px; background: var(--sheet); border-left: 4px double var(--margin); }
  h1 { font: 400 27px/36px Literata, Georgia, serif; margin: 0 0 4px; }
  .soft { color: var(--soft); }
  table { border-collapse: collapse; width: 100%; margin: 16px 0; }
  th { text-align: left; font-size: 13px; line-height: 18px; color: var(--soft); font-weight: 400; border-bottom: 1px solid var(--ink); padding: 4px 12px 4px 0; }
  td { border-bottom: 1px solid var(--hair); padding: 7px 12px 6px 0; vertical-align: top; overflow-wrap: anywhere; }
  td.when { white-space: nowrap; font-variant-numeric: tabular-nums; }
  a { color: var(--link); text-underline-offset: 3px; }
  :focus-visible { outline: 3px solid var(--focus); outline-offset: 2px; }
  dl { display: grid; grid-template-columns: max-content 1fr; gap: 2px 16px; margin: 12px 0 20px; } dt { color: var(--soft); } dd { margin: 0; overflow-wrap: anywhere; }
  h2 { font: 400 20px/28px Literata, Georgia, serif; border-bottom: 1px solid var(--ink); margin: 24px 0 8px; }
  pre { font: 14px/20px ui-monospace, monospace; white-space: pre-wrap; overflow-wrap: anywhere; margin: 0; }
  iframe { width: 100%; height: 560px; border: 1px solid var(--rule); background: #fff; }
  form { display: flex; gap: 8px; align-items: end; flex-wrap: wrap; margin-top: 12px; }
  label { display: grid; gap: 2px; } input, button { font: inherit; min-height: 36px; padding: 4px 10px; border: 1px solid var(--rule); border-radius: 2px; background: var(--sheet); color: var(--ink); }
  button { cursor: pointer; }
`;

function page(title: string, body: string): string {
  return `<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><link rel="icon" href="data:,"><title>${escaped(title)}: Withy mailbox</title><style>${style}</style></head><body><main>${body}</main></body></html>`;
}

const clock = new Intl.DateTimeFormat("en-GB", {
  dateStyle: "medium",
  timeStyle: "medium",
  timeZone: "Europe/London",
});
const subjectOf = (mail: CaughtMail): string => mail.parsed.subject ?? "(no subject)";

export function listPage(mails: readonly CaughtMail[], to: string | null): string {
  const rows = mails.map((mail) => {
    // A calendar also travels as a part without a name, which mail readers use and people never see.
    const files = mail.parsed.attachments.flatMap((file) => file.filename ?? []).join(", ");
    return `<tr><td class="when">${clock.format(mail.receivedAt)}</td><td>${escaped(mail.envelopeTo.join(", "))}</td><td><a href="/mailbox/${mail.id}">${escaped(subjectOf(mail))}</a></td><td>${escaped(files)}</td></tr>`;
  });
  const table =
    rows.length === 0
      ? `<p>${to ? "No mail to this address yet." : "No mail yet. Book an appointment, and its confirmation arrives here."}</p>`
      : `<table><thead><tr><th scope="col">Caught</th><th scope="col">To</th><th scope="col">Subject</th><th scope="col">Files</th></tr></thead><tbody>${rows.join("")}</tbody></table>`;
  return page(
    "All mail",
    `<h1>Mailbox</h1><p class="soft">Every mail that Withy sends on this machine ends here and goes no further. <a href="/card">Card payments</a></p>
    <form method="get" action="/mailbox"><label>To <input name="to" type="text" value="${escaped(to ?? "")}" autocomplete="off"></label><button>Show</button></form>
    ${table}`,
  );
}

export function mailPage(mail: CaughtMail): string {
  const { parsed } = mail;
  const facts: [string, string][] = [
    ["Caught", clock.format(mail.receivedAt)],
    ["From", parsed.from?.text ?? ""],
    ["To", mail.envelopeTo.join(", ")],
    ["Reply to", parsed.replyTo?.text ?? ""],
    ["Message-ID", parsed.messageId ?? ""],
  ];
  const list = facts
    .filter(([, value]) => value !== "")
    .map(([term, value]) => `<dt>${term}</dt><dd>${escaped(value)}</dd>`);
  const files = parsed.attachments.map(
    (file, index) =>
      `<li><a href="/mailbox/${mail.id}/files/${index}">${escaped(file.filename ?? `file ${index + 1}`)}</a> <span class="soft">${escaped(file.contentType)}, ${file.size} bytes</span></li>`,
  );
  // The mail is shown as its reader sees it, but in a frame that may run nothing.
  const html =
    parsed.html === false
      ? ""
      : `<h2>As HTML</h2><iframe title="The mail as HTML" sandbox="allow-popups allow-top-navigation-by-user-activation" src="/mailbox/${mail.id}/html"></iframe>`;
  return page(
    subjectOf(mail),
    `<p><a href="/mailbox">All mail</a></p><h1>${escaped(subjectOf(mail))}</h1><dl>${list.join("")}</dl>
    ${files.length > 0 ? `<h2>Files</h2><ul>${files.join("")}</ul>` : ""}${html}<h2>As plain text</h2><pre>${escaped(parsed.text ?? "")}</pre>`,
  );
}
