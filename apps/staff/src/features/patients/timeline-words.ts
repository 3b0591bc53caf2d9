import {
  type MessageState,
  type MessageTemplate,
  messageStateWords,
  messageTemplateWords,
} from "@withy/contracts/message-words";
import type { MessageEntry, TimelineEntry, VisitEntry } from "@withy/contracts/patients";
import { formatMoney } from "@withy/core/money";
import { dayAndYear } from "./short-day";

export interface EntryWords {
  title: string;
  detail: string;
  /** Where the line leads, where the person may go there. */
  href: string | null;
}

/** What a line of the timeline says. */
export function entryWords(entry: TimelineEntry, patientId: string): EntryWords {
  switch (entry.kind) {
    case "visit":
      return visitWords(entry);
    case "note":
      return {
        title: `Note signed by ${entry.authorName}`,
        detail: entry.problem ?? "",
        href: entry.problem === null ? null : `/notes/${entry.id}`,
      };
    case "measure":
      return {
        title: entry.measureName,
        detail: [entry.result, entry.takenOn === entry.day ? "" : `taken ${dayAndYear(entry.takenOn)}`]
          .filter(Boolean)
          .join(", "),
        href: `/patients/${patientId}/measures`,
      };
    case "letter":
      return {
        title: entry.state === "signed" ? `Letter ${entry.reference} signed` : "Letter begun, not signed",
        detail: `To ${entry.recipientName}`,
        href: `/letters/${entry.id}`,
      };
    case "invoice":
      return {
        title: `Invoice ${entry.reference}, ${formatMoney(entry.totalPence)}`,
        detail: invoiceStates[entry.state] ?? entry.state,
        href: `/billing/invoices/${entry.id}`,
      };
    case "payment":
      return {
        title: `Paid ${formatMoney(entry.amountPence)}`,
        detail: `${methods[entry.method]}, invoice ${entry.reference}`,
        href: `/billing/invoices/${entry.invoiceId}`,
      };
    case "message":
      return messageWords(entry);
  }
}

function visitWords(entry: VisitEntry): EntryWords {
  const title =
    entry.state === "cancelled"
      ? `Visit cancelled by ${entry.cancelledBy === "clinic" ? "us" : "the patient"}${entry.isLateCancellation ? ", late" : ""}`
      : `${entry.serviceName}, ${entry.minutes} min`;
  return {
    title,
    detail: `${entry.therapistName}, ${entry.siteName}`,
    href: `/diary?day=${entry.day}&site=${entry.siteId}&at=${entry.id}`,
  };
}

function messageWords(entry: MessageEntry): EntryWords {
  const name = messageTemplateWords[entry.template as MessageTemplate] ?? "Message";
  return {
    title: `${name}, by e-mail`,
    detail: messageStateWords[entry.state as MessageState] ?? "",
    href: null,
  };
}

const methods = { cash: "Cash", card: "Card by link", terminal: "Card terminal", bank: "Bank" };

const invoiceStates: Record<string, string> = {
  issued: "Issued",
  "part-paid": "Part paid",
  paid: "Paid",
  void: "Void",
  refunded: "Refunded",
};
