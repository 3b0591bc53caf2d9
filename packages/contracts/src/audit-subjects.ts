/** What an event may be about, as the browser's filter offers it. */
export const auditSubjects = [
  "patient",
  "appointment",
  "course",
  "waiting-entry",
  "offer-round",
  "episode",
  "note",
  "measure-record",
  "programme",
  "letter",
  "invoice",
  "payment",
  "session",
  "staff-member",
] as const;
