import "@/features/letters/letter.css";
import "@/features/letters/letter-list.css";
import { listLetters } from "@withy/services/letters";
import type { Metadata } from "next";
import { LettersScreen } from "@/features/letters/components/letters-screen";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Letters" };

const states = ["all", "draft", "signed"] as const;

export default async function LettersPage({ searchParams }: PageProps<"/letters">) {
  const ctx = await requireContext("letters.read");
  const query = await searchParams;
  const state = states.find((one) => one === query["state"]) ?? "all";
  const page = Math.max(1, Number(query["page"]) || 1);
  const letters = await orNotFound(listLetters(ctx, { state, page }));
  return <LettersScreen key={`${state} ${page}`} state={state} first={letters} zone={ctx.zone} />;
}
