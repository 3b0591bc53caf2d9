import { isId } from "@withy/core/ids";
import { getDayList, listUnsignedNotes } from "@withy/services/clinical";
import type { Metadata } from "next";
import { NotesToSign } from "@/features/clinical/components/notes-to-sign";
import { requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";

export const metadata: Metadata = { title: "Notes to sign" };

export default async function NotesPage({ searchParams }: PageProps<"/notes">) {
  const context = await requireContext("clinical.write");
  const { visit } = await searchParams;
  const [day, unsigned] = await Promise.all([getDayList(context, {}), listUnsignedNotes(context, {})]);
  return <NotesToSign day={day} unsigned={unsigned} chosenVisit={isId(visit) ? String(visit) : null} />;
}
