import { longDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/zoned-time";
import { type EmailSender, type RenderedEmail, renderEmail } from "./email";

export interface InvoiceMessage {
  readonly sender: EmailSender;
  readonly greetingName: string;
  readonly invoiceNumber: string;
  readonly total: Pence;
  readonly stillToPay: Pence;
  readonly dueOn: PlainDateText;
  /** Where it can be paid by card; null where it cannot, or nothing is left to pay. */
  readonly payUrl: string | null;
  readonly pdf: Buffer;
}

export function invoiceSent(message: InvoiceMessage): RenderedEmail {
  const { sender, invoiceNumber, total, stillToPay, dueOn, payUrl } = message;
  const isPaid = stillToPay <= 0;
  const due = isPaid
    ? [{ label: "Paid", value: "In full, thank you" }]
    : [
        { label: "Still to pay", value: formatMoney(stillToPay) },
        { label: "Due", value: longDate(dueOn) },
      ];
  return renderEmail(
    {
      subject: `Invoice ${invoiceNumber} from ${sender.practice}`,
      greeting: `Dear ${message.greetingName}`,
      paragraphs: ["Your invoice is attached."],
      facts: [
        { label: "Invoice", value: invoiceNumber },
        { label: "Total", value: formatMoney(total) },
        ...due,
      ],
      ...(payUrl && !isPaid ? { action: { label: `Pay ${formatMoney(stillToPay)}`, url: payUrl } } : {}),
      from: sender,
    },
    [
      {
        filename: `invoice-${invoiceNumber.replace(/[^A-Za-z0-9-]/g, "-")}.pdf`,
        contentType: "application/pdf",
        content: message.pdf,
      },
    ],
  );
}
