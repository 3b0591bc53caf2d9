export { checkHealth, type Health } from "./check-health";
export { enqueueMessage, type OutgoingMessage } from "./enqueue-message";
