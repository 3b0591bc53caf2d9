import { useQueryClient } from "@tanstack/react-query";
import type { AppointmentView, DayAppointment, DiaryDayView } from "@withy/contracts/diary";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import type { Mark } from "../components/sheet-states";
import { clock } from "../minute-words";
import { diaryKeys } from "../query-keys";
import type { Drag } from "./use-day-drag";
import { useMarkAppointment } from "./use-mark-appointment";
import { useMoveAppointment } from "./use-move-appointment";
import { useUndoMark } from "./use-undo-mark";

/** The verbs of the day that need no form, and the sentence of the last one that was refused. */
export function useDayVerbs(day: DiaryDayView) {
  const mark = useMarkAppointment();
  const move = useMoveAppointment();
  const undo = useUndoMark();
  const [problem, setProblem] = useState<string | null>(null);
  const client = useQueryClient();
  /** The day is read again a moment after a write; until then the write's own answer knows the newer version. */
  const newest = (a: DayAppointment): { id: string; version: number; state: string } => {
    const answered = client.getQueryData<AppointmentView>(diaryKeys.appointment(a.id));
    return answered && answered.version > a.version ? answered : a;
  };
  const answer = {
    onSuccess: () => setProblem(null),
    onError: (error: unknown) => setProblem(problemItems(error)[0]?.message ?? null),
  };

  const drop = ({ appointment: a, to }: Drag) => {
    const column = day.columns[to.column];
    const isSame =
      to.minute === a.fromMinute && column?.id === (day.by === "room" ? a.roomId : a.therapistId);
    if (!column || (isSame && column.siteId === a.siteId)) return;
    const origin = { startsAt: a.startsAt, siteId: a.siteId, therapistId: a.therapistId, roomId: a.roomId };
    const target = day.by === "room" ? { roomId: column.id } : { therapistId: column.id };
    const input = {
      appointmentId: a.id,
      version: newest(a).version,
      startsAt: `${day.day}T${clock(to.minute)}`,
      siteId: column.siteId,
    };
    move.mutate({ ...input, ...target, origin }, answer);
  };

  return {
    problem,
    isBusy: mark.isPending || undo.isPending,
    clear: () => setProblem(null),
    drop,
    mark: (a: DayAppointment, to: Mark) =>
      mark.mutate({ appointmentId: a.id, version: newest(a).version, to }, answer),
    undo: (a: DayAppointment) => {
      const { id, version, state } = newest(a);
      undo.mutate({ appointmentId: id, version, isCancelled: state === "cancelled" }, answer);
    },
  };
}
