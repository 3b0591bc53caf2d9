import { accountMessagePayload } from "@withy/contracts/messaging";
import { passwordReset, staffInvitation } from "@withy/documents/message/account-emails";
import { linkTo, type Renderer } from "./message-renderer";
import { loadSender } from "./message-sender";

export const renderPasswordReset: Renderer = async (ctx, row, office) => {
  const payload = accountMessagePayload.parse(row.payload);
  const sender = await loadSender(ctx, row.practiceId);
  return passwordReset({ ...payload, sender, url: linkTo(office, payload.path) });
};

export const renderStaffInvitation: Renderer = async (ctx, row, office) => {
  const payload = accountMessagePayload.parse(row.payload);
  const sender = await loadSender(ctx, row.practiceId);
  const invitedBy = payload.invitedBy ?? sender.practice;
  return staffInvitation({ ...payload, sender, url: linkTo(office, payload.path) }, invitedBy);
};
