import "@/features/letters/letter.css";
import { getLetter } from "@withy/services/letters";
import type { Metadata } from "next";
import { LetterPage } from "@/features/letters/components/letter-page";
import { orNotFound, requireContext } from "@/server/context";

export const metadata: Metadata = { title: "Letter" };

export default async function LetterRoute({ params }: PageProps<"/letters/[letterId]">) {
  const ctx = await requireContext("letters.read");
  const { letterId } = await params;
  const letter = await orNotFound(getLetter(ctx, { letterId }));
  return <LetterPage key={letter.id} letter={letter} />;
}
