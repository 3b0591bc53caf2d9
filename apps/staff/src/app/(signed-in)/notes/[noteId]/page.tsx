import { dayOf } from "@withy/core/zoned-time";
import { getDayList, getNote, listMeasures } from "@withy/services/clinical";
import type { Metadata } from "next";
import { NotePage } from "@/features/clinical/components/note-page";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/clinical/clinical.css";
import "@/features/clinical/note-page.css";
import "@/features/clinical/patient-head.css";
import "@/features/clinical/day-strip.css";
import "@/features/clinical/note-lines.css";
import "@/features/clinical/note-bar.css";

export const metadata: Metadata = { title: "Note" };

export default async function NoteRoute({ params }: PageProps<"/notes/[noteId]">) {
  const context = await requireContext("clinical.read");
  const { noteId } = await params;
  const note = await orNotFound(getNote(context, { noteId }));
  const [measures, day] = await Promise.all([
    listMeasures(context, { episodeId: note.episode.id }),
    getDayList(context, { day: dayOf(new Date(note.visitAt), note.zone) }),
  ]);
  return <NotePage key={note.id} note={note} measures={measures} day={day} />;
}
