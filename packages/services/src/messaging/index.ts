export { type MailGateway, type MailSettings, openMail } from "@withy/gateways/mail";
export { beatHeart, stopHeart } from "./beat-heart";
export { checkHealth, type Health } from "./check-health";
export { type DrainOptions, drainOutbox } from "./drain-outbox";
export { enqueueMessage, type OutgoingMessage } from "./enqueue-message";
export { countMessages, listMessages } from "./list-messages";
export { pruneOldClaims } from "./prune-claims";
export { type JobHandler, type JobRun, runNextJob } from "./run-jobs";
export { sendMessageAgain } from "./send-message-again";
