import { describe, expect, it } from "vitest";
import { passwordReset, staffInvitation } from "./account-emails";
import {
  type AppointmentMessage,
  bookingCancelled,
  bookingConfirmed,
  bookingMoved,
  visitReminder,
} from "./appointment-emails";
import { renderEmail } from "./email";
import { invoiceSent } from "./invoice-email";
import { letterWaiting } from "./letter-email";

const sender = {
  practice: "Marram Physiotherapy",
  contactLines: ["Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA", "01632 960 110"],
};
const url = "http://localhost:3000/link/abcDEF123";
const visit: AppointmentMessage = {
  appointment: {
    id: "01890000-0000-7000-8000-000000000001",
    version: 1,
    startsAt: new Date("2026-07-08T16:30:00Z"),
    endsAt: new Date("2026-07-08T17:15:00Z"),
    practiceEmail: "hello@marram.example",
    place: "Saltgate, 12 Tollgate Row, Easterhaven ZZ4 2QA",
    withWhom: "Nia Prosser, physiotherapist",
    attendee: { name: "Eleri Tamworth", email: "eleri@post.example" },
    at: new Date("2026-07-01T10:00:00Z"),
  },
  sender,
  phone: "01632 960 110",
  zone: "Europe/London",
  greetingName: "Eleri",
  noticeHours: 24,
};
const account = { sender, greetingName: "Nia", url, validFor: "one hour" };
const every = [
  bookingConfirmed(visit),
  bookingMoved(visit, new Date("2026-07-07T09:00:00Z")),
  bookingCancelled(visit),
  passwordReset(account),
  staffInvitation(account, "Bethan Rowe"),
  letterWaiting({ sender, recipientName: "Dr Hanne Pryor", reference: "L-0613", url, validFor: "30 days" }),
  visitReminder(visit),
  invoiceSent({
    sender,
    greetingName: "Eleri",
    invoiceNumber: "MP-000123",
    total: 6200,
    stillToPay: 6200,
    dueOn: "2026-07-22",
    payUrl: url,
    pdf: Buffer.from("%PDF"),
  }),
];

describe("every message", () => {
  it.each(every.map((email) => [email.subject, email] as const))(
    "%s: says the same in text and in HTML, with one action at most",
    (_, email) => {
      expect(email.html.match(/<a /g)?.length ?? 0).toBeLessThanOrEqual(1);
      const visible = email.html
        .replace(/<head>.*<\/head>/s, "")
        .replace(/<[^>]+>/g, "\n")
        .replaceAll("&#39;", "'");
      for (const line of visible.split("\n").filter((part) => part.trim() !== ""))
        expect(email.text).toContain(line.trim());
      expect(`${email.subject}${email.text}`).not.toMatch(/[\u2014!]/);
      expect(email.html).toContain('lang="en-GB"');
    },
  );

  it("gives times as the site's clock shows them, summer time too", () => {
    expect(every[0]?.subject).toBe("Your appointment on Wednesday 8 July 2026 at 5:30pm");
    expect(every[1]?.text).toContain("Before, it was Tuesday 7 July 2026 at 10am.");
  });

  it("carries the calendar file for a booking, a move and a cancellation", () => {
    expect(every.slice(0, 3).map((email) => email.calendar?.method)).toEqual([
      "REQUEST",
      "REQUEST",
      "CANCEL",
    ]);
    expect(every.slice(0, 3).map((email) => email.calendar?.filename)).toEqual(
      Array(3).fill("appointment.ics"),
    );
  });

  it("asks for no money that is already paid", () => {
    const paid = invoiceSent({
      sender,
      greetingName: "Eleri",
      invoiceNumber: "MP-1",
      total: 6200,
      stillToPay: 0,
      dueOn: "2026-07-22",
      payUrl: url,
      pdf: Buffer.from(""),
    });
    expect(paid.html).not.toContain("<a ");
    expect(paid.text).not.toContain("Still to pay");
  });

  it("gives a reference to ring about where it may name nobody", () => {
    expect(every[5]?.text).toContain("give the reference L-0613");
  });
});

describe("text from outside", () => {
  const nasty = {
    subject: "Hello\r\nBcc: all@post.example\u2028x",
    greeting: 'Dear <b>&"O\'Neill"</b>',
    paragraphs: ["<script>alert(1)</script>"],
    from: sender,
  };

  it("cannot add a header or a tag", () => {
    const email = renderEmail(nasty);
    expect(email.subject).toBe("Hello Bcc: all@post.example x");
    expect(email.html).toContain("Dear &lt;b&gt;&amp;&quot;O&#39;Neill&quot;&lt;/b&gt;");
    expect(email.html).not.toContain("<script>");
  });

  it.each(["javascript:alert(1)", "data:text/html,x", "not a url"])("may not link to %s", (bad) => {
    expect(() => renderEmail({ ...nasty, action: { label: "Go", url: bad } })).toThrow();
  });
});
