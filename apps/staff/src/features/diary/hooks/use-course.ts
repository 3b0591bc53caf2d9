import { keepPreviousData, skipToken, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { CourseView } from "@withy/contracts/diary";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import { useState } from "react";
import {
  type BookCourse,
  bookCourse,
  type CourseQuery,
  fetchCourse,
  fetchExtension,
  fetchProposal,
} from "../course-client";
import { diaryKeys } from "../query-keys";

export function useCourse(first: CourseView) {
  return useQuery({
    queryKey: diaryKeys.course(first.id),
    queryFn: ({ signal }) => fetchCourse(first.id, signal),
    initialData: first,
    staleTime: 5_000,
  }).data;
}

export function useProposal(query: CourseQuery | null) {
  return useQuery({
    queryKey: diaryKeys.proposal(query ?? {}),
    queryFn: query ? ({ signal }) => fetchProposal(query, signal) : skipToken,
    placeholderData: keepPreviousData,
  });
}

export function useExtension(courseId: string, visits: number | null) {
  return useQuery({
    queryKey: diaryKeys.proposal({ courseId, visits }),
    queryFn: ({ signal }) => fetchExtension(courseId, visits ?? 1, signal),
    enabled: visits !== null,
    placeholderData: keepPreviousData,
  });
}

/** An act on a course: puts the answer in place, reads the diary again, and adds a line to the recent changes. */
export function useCourseAct<Input, Answer>(
  run: (input: Input) => Promise<Answer>,
  viewOf: (answer: Answer) => CourseView,
  describe: (view: CourseView, input: Input) => string,
) {
  const client = useQueryClient();
  const { announce } = useChanges();
  return useMutation({
    mutationFn: run,
    onSuccess: (answer, input) => {
      const view = viewOf(answer);
      client.setQueryData(diaryKeys.course(view.id), view);
      announce({ at: timeOf(new Date(), view.site.zone), said: describe(view, input) });
      void client.invalidateQueries({ queryKey: diaryKeys.all });
    },
    // Somebody else's change, or a time that has just gone, shows at once.
    onError: () => void client.invalidateQueries({ queryKey: diaryKeys.all }),
  });
}

/** One key for each wording of the form: pressing twice books once, a corrected form is a new booking. */
export function useBookCourse() {
  const [last, setLast] = useState({ body: "", key: "" });
  const run = (input: BookCourse) => {
    const body = JSON.stringify(input);
    const key = body === last.body ? last.key : crypto.randomUUID();
    setLast({ body, key });
    return bookCourse(input, key);
  };
  return useCourseAct(
    run,
    (view) => view,
    (view) => `Course of ${view.visits.length} booked for ${view.patient.name} with ${view.therapist.name}`,
  );
}
