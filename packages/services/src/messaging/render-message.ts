import type { RenderedEmail } from "@withy/documents/message/email";
import type { SystemContext } from "../context";
import type { OutboxRow } from "./claim-messages";
import type { PostOffice, Renderer } from "./message-renderer";
import { renderPasswordReset, renderStaffInvitation } from "./render-account-message";
import { renderAppointmentMessage } from "./render-appointment-message";
import { renderCourseMessage } from "./render-course-message";
import { renderLetterMessage } from "./render-letter-message";
import { renderOfferMessage } from "./render-offer-message";
import { renderVisitReminder } from "./render-visit-reminder";

const renderers: Record<string, Renderer> = {
  "booking-confirmed": renderAppointmentMessage,
  "booking-moved": renderAppointmentMessage,
  "booking-cancelled": renderAppointmentMessage,
  "visit-reminder": renderVisitReminder,
  "course-booked": renderCourseMessage,
  "course-moved": renderCourseMessage,
  "course-cancelled": renderCourseMessage,
  "password-reset": renderPasswordReset,
  "staff-invitation": renderStaffInvitation,
  "letter-waiting": renderLetterMessage,
  "offer-made": renderOfferMessage,
  "offer-gone": renderOfferMessage,
};

/** The message of an outbox row, or null where it must no longer go. */
export async function renderMessage(
  ctx: SystemContext,
  row: OutboxRow,
  office: PostOffice,
): Promise<RenderedEmail | null> {
  const render = renderers[row.template];
  if (!render) throw new Error(`No renderer for the template ${row.template}`);
  return render(ctx, row, office);
}
