/** Templates of the messages about one visit. */
export const appointmentTemplates = [
  "booking-confirmed",
  "booking-moved",
  "booking-cancelled",
  "visit-reminder",
] as const;
export type AppointmentTemplate = (typeof appointmentTemplates)[number];

/** Templates of the messages about the visits of a course, told together. */
export const courseTemplates = ["course-booked", "course-moved", "course-cancelled"] as const;
export type CourseTemplate = (typeof courseTemplates)[number];

export const accountTemplates = ["password-reset", "staff-invitation"] as const;
export type AccountTemplate = (typeof accountTemplates)[number];

/** Messages to whoever waits for another time. */
export const offerTemplates = ["offer-made", "offer-gone"] as const;
export type OfferTemplate = (typeof offerTemplates)[number];

export type MessageTemplate =
  | AppointmentTemplate
  | CourseTemplate
  | AccountTemplate
  | OfferTemplate
  | "letter-waiting";

export const messageTemplates: readonly MessageTemplate[] = [
  ...appointmentTemplates,
  ...courseTemplates,
  ...accountTemplates,
  ...offerTemplates,
  "letter-waiting",
];

export const messageTemplateWords: Record<MessageTemplate, string> = {
  "booking-confirmed": "Appointment booked",
  "booking-moved": "Appointment moved",
  "booking-cancelled": "Appointment cancelled",
  "visit-reminder": "Reminder",
  "course-booked": "Course booked",
  "course-moved": "Course moved",
  "course-cancelled": "Rest of a course cancelled",
  "password-reset": "New password",
  "staff-invitation": "Invitation",
  "offer-made": "Earlier time offered",
  "offer-gone": "Offered time has gone",
  "letter-waiting": "Letter",
};

export const messageStates = ["waiting", "claimed", "sent", "failed", "dropped"] as const;
export type MessageState = (typeof messageStates)[number];

/** What is shown for each state; "claimed" lasts seconds and is told as waiting. */
export const messageStateWords: Record<MessageState, string> = {
  waiting: "Waiting to go",
  claimed: "Waiting to go",
  sent: "Sent",
  failed: "Not sent",
  dropped: "Not needed",
};
