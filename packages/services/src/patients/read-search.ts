import { readDate } from "@withy/core/date-words";
import { readNhsNumber } from "@withy/core/identifiers/nhs-number";
import { foldName } from "@withy/core/names";

/** What the one box may mean. Several can hold at once: ten digits may be a phone or an NHS number. */
export interface SearchMeaning {
  /** Folded words of a name; empty where no name was typed. */
  words: string[];
  bornOn: string | null;
  nhsNumber: string | null;
  /** Last digits of a phone, from the end. */
  phoneFromEnd: string | null;
  invoiceNumber: number | null;
}

const nothing: SearchMeaning = {
  words: [],
  bornOn: null,
  nhsNumber: null,
  phoneFromEnd: null,
  invoiceNumber: null,
};

/** Reads what was typed into the patient search. @param today the practice's day, where two-digit years end */
export function readSearch(text: string, today: string): SearchMeaning {
  const typed = text.trim();
  if (!/\d/.test(typed)) return { ...nothing, words: wordsOf(typed) };
  const invoice = /^[a-z]{1,6}[\s-]?(\d{1,9})$/i.exec(typed);
  if (invoice) return { ...nothing, invoiceNumber: Number(invoice[1]) };
  const bornOn = readBirthDate(typed, today);
  const named = /^([^\d]*[^\d\s,])[\s,]+(\d.*)$/.exec(typed);
  if (bornOn === null && named) {
    const born = readBirthDate(named[2] ?? "", today);
    if (born !== null) return { ...nothing, words: wordsOf(named[1] ?? ""), bornOn: born };
  }
  if (/[a-z]/i.test(typed))
    return bornOn === null ? { ...nothing, words: wordsOf(typed) } : { ...nothing, bornOn };
  return { ...nothing, bornOn, ...readDigits(typed) };
}

function wordsOf(text: string): string[] {
  return foldName(text)
    .split(" ")
    .filter((word) => word !== "")
    .slice(0, 5);
}

function readBirthDate(text: string, today: string): string | null {
  const hasYear = /\d{4}/.test(text) || /\d+\D+\d+\D+\d{2}$/.test(text) || /[a-z]\D*\d{2}$/i.test(text);
  return hasYear ? readDate(text, today, { past: true }) : null;
}

function readDigits(text: string): Partial<SearchMeaning> {
  const digits = text.replace(/\D/g, "");
  const bare = digits.replace(/^0+/, "");
  return {
    nhsNumber: readNhsNumber(text),
    phoneFromEnd: bare.length >= 4 ? [...bare].reverse().join("") : null,
    invoiceNumber: /^\d{1,7}$/.test(text) ? Number(text) : null,
  };
}
