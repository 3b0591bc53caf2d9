import "@/features/messaging/messages.css";
import { countMessages, listMessages } from "@withy/services/messaging";
import type { Metadata } from "next";
import { MessagesScreen } from "@/features/messaging/components/messages-screen";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Messages sent" };

const states = ["all", "waiting", "sent", "failed"] as const;

export default async function MessagesPage({ searchParams }: PageProps<"/messages">) {
  const ctx = await requireContext("messaging.read");
  const query = await searchParams;
  const state = states.find((one) => one === query["state"]) ?? "all";
  const page = Math.max(1, Number(query["page"]) || 1);
  const [messages, counts] = await Promise.all([
    orNotFound(listMessages(ctx, { state, page })),
    countMessages(ctx, {}),
  ]);
  return (
    <MessagesScreen key={`${state} ${page}`} state={state} first={messages} counts={counts} zone={ctx.zone} />
  );
}
