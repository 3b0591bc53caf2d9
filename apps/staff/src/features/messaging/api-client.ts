import type { ListMessagesInput, MessageRow } from "@withy/contracts/messaging";
import type { Page } from "@withy/contracts/page";
import { get, write } from "@/api/request";

export type MessageFilters = Omit<ListMessagesInput, "pageSize" | "page"> & { page?: number };

export const fetchMessages = (filters: MessageFilters, signal?: AbortSignal) =>
  get<Page<MessageRow>>("/api/messaging/messages", { ...filters }, signal);

export const sendMessageAgain = (messageId: string, key: string) =>
  write<{ messageId: string }>("POST", `/api/messaging/messages/${messageId}/send-again`, {}, key);
