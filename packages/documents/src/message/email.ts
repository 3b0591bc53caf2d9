/** What every message says, before it is laid out. One action at most, so that nobody wonders what to press. */
export interface EmailContent {
  readonly subject: string;
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  /** Facts to read at a glance, such as when and where. */
  readonly facts?: readonly { readonly label: string; readonly value: string }[];
  readonly action?: { readonly label: string; readonly url: string };
  /** After the action: how long it holds, or what to do otherwise. */
  readonly after?: readonly string[];
  readonly from: EmailSender;
}

export interface EmailSender {
  readonly practice: string;
  /** Telephone and address, shown at the foot. */
  readonly contactLines: readonly string[];
}

export interface EmailAttachment {
  readonly filename: string;
  readonly contentType: string;
  readonly content: string | Buffer;
}

export interface RenderedEmail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly attachments: readonly EmailAttachment[];
  /** Set where the message carries an invitation or its withdrawal, which mail readers treat as such. */
  readonly calendar?: {
    readonly method: "REQUEST" | "CANCEL";
    readonly filename: string;
    readonly content: string;
  };
}

const entities: Record<string, string> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};
const escaped = (text: string): string => text.replace(/[&<>"']/g, (c) => entities[c] ?? c);

/** One line without control characters: a name with a line break in it must never start a header of its own. */
export function headerText(text: string): string {
  return text
    .replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, " ")
    .replace(/ {2,}/g, " ")
    .trim();
}

function safeUrl(url: string): string {
  const parsed = new URL(url);
  if (parsed.protocol !== "https:" && parsed.protocol !== "http:")
    throw new Error("A message may link to a web address only");
  return parsed.toString();
}

function plainText({ greeting, paragraphs, facts = [], action, after = [], from }: EmailContent): string {
  const blocks = [
    greeting,
    ...paragraphs,
    ...(facts.length > 0 ? [facts.map((fact) => `${fact.label}: ${fact.value}`).join("\n")] : []),
    ...(action ? [`${action.label}:\n${safeUrl(action.url)}`] : []),
    ...after,
    ["-- ", from.practice, ...from.contactLines].join("\n"),
  ];
  return `${blocks.join("\n\n")}\n`;
}

const style = {
  body: "margin:0;padding:24px 12px;background:#F6F2E7;color:#1F2724",
  sheet:
    "max-width:560px;margin:0 auto;padding:28px;background:#FFFDF7;border-top:3px double #1F2724;font:17px/26px Georgia,'Times New Roman',serif",
  fact: "padding:6px 16px 6px 0;border-bottom:1px solid #DDD6C4;vertical-align:top;text-align:left;font-weight:normal",
  label: "color:#55605A;white-space:nowrap",
  button:
    "display:inline-block;padding:11px 20px;background:#21503F;color:#FFFDF7;text-decoration:none;border-radius:2px;font:bold 16px/22px Arial,Helvetica,sans-serif",
  foot: "margin:24px 0 0;padding-top:12px;border-top:1px solid #857E6B;color:#55605A;font:14px/20px Arial,Helvetica,sans-serif",
};

function html({ subject, greeting, paragraphs, facts = [], action, after = [], from }: EmailContent): string {
  const paragraph = (text: string) => `<p style="margin:0 0 14px">${escaped(text)}</p>`;
  const rows = facts.map(
    (fact) =>
      `<tr><th scope="row" style="${style.fact};${style.label}">${escaped(fact.label)}</th><td style="${style.fact}">${escaped(fact.value)}</td></tr>`,
  );
  const table =
    rows.length > 0
      ? `<table style="border-collapse:collapse;width:100%;margin:0 0 18px;font:inherit">${rows.join("")}</table>`
      : "";
  const button = action
    ? `<p style="margin:0 0 18px"><a href="${escaped(safeUrl(action.url))}" style="${style.button}">${escaped(action.label)}</a></p>`
    : "";
  const foot = [from.practice, ...from.contactLines].map(escaped).join("<br>");
  return [
    `<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escaped(subject)}</title></head>`,
    `<body style="${style.body}"><div style="${style.sheet}">`,
    paragraph(greeting),
    ...paragraphs.map(paragraph),
    table,
    button,
    ...after.map(paragraph),
    `<p style="${style.foot}">${foot}</p></div></body></html>`,
  ].join("\n");
}

/** Lays out a message as plain text and as HTML that says the same. Everything put in is escaped. */
export function renderEmail(
  content: EmailContent,
  attachments: readonly EmailAttachment[] = [],
): RenderedEmail {
  return { subject: headerText(content.subject), text: plainText(content), html: html(content), attachments };
}
