import { letterMessagePayload } from "@withy/contracts/messaging";
import { letterWaiting } from "@withy/documents/message/letter-email";
import { linkTo, type Renderer } from "./message-renderer";
import { loadSender } from "./message-sender";

export const renderLetterMessage: Renderer = async (ctx, row, office) => {
  const payload = letterMessagePayload.parse(row.payload);
  const sender = await loadSender(ctx, row.practiceId);
  return letterWaiting({ ...payload, sender, url: linkTo(office, payload.path) });
};
