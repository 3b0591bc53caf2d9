"use client";
import type { BookingChoicesView } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import type { ComboboxOption } from "@withy/ui/combobox";
import { EmptyState } from "@withy/ui/empty-state";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { Page, PageTitle } from "@withy/ui/page";
import { SectionHead } from "@withy/ui/section-head";
import { Skeleton } from "@withy/ui/skeleton";
import { useRouter } from "next/navigation";
import { useDeferredValue, useMemo, useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import {
  type Chosen,
  type CourseWish,
  changesOf,
  courseErrors,
  courseQuery,
  proposalErrors,
} from "../course-wish";
import { useBookCourse, useProposal } from "../hooks/use-course";
import { CourseFields } from "./course-fields";
import { ProposedVisits } from "./proposed-visits";

export interface CourseScreenProps {
  choices: BookingChoicesView;
  start: CourseWish;
  startPatient: ComboboxOption | null;
  today: string;
}

const toId = (field: string) =>
  field.startsWith("changes.") ? `visit-${field.slice(8)}` : `course-${field}`;

/** A course of visits: what it is to be on the left, each visit as it would stand on the right. Booked whole or not. */
export function CourseScreen({ choices, start, startPatient, today }: CourseScreenProps) {
  const router = useRouter();
  const [wish, setWish] = useState(start);
  const [patient, setPatient] = useState(startPatient);
  const [chosen, setChosen] = useState<Chosen>({});
  const [missing, setMissing] = useState<FieldError[]>([]);
  const [attempt, setAttempt] = useState(0);
  const query = useMemo(() => courseQuery(wish, patient?.id ?? null), [wish, patient]);
  const proposal = useProposal(useDeferredValue(query));
  const book = useBookCourse();
  const isAwake = useAwake();
  const refused = book.error && missing.length === 0 ? problemItems(book.error, toId) : [];
  const errors = missing.length > 0 ? missing : refused;
  const errorOf = (id: string) => errors.find((error) => error.id === id)?.message;
  const change = (part: Partial<CourseWish>) => {
    setWish((before) => ({ ...before, ...part }));
    setChosen({});
  };
  const submit = () => {
    const found = courseErrors(wish, patient?.id ?? null);
    if (found.length === 0 && proposal.data) found.push(...proposalErrors(proposal.data, chosen));
    setMissing(found);
    setAttempt((n) => n + 1);
    if (found.length > 0 || !query || !proposal.data) return;
    book.mutate(
      { ...query, changes: changesOf(chosen) },
      { onSuccess: (view) => router.push(`/diary/course/${view.id}`) },
    );
  };
  const isShown = query !== null && proposal.data !== undefined;
  return (
    <Page className="coursepage">
      <form
        className="courseform"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <PageTitle title="Book a course" />
        <ErrorSummary errors={errors} attempt={`${attempt} ${book.submittedAt} ${book.failureCount}`} />
        <CourseFields
          choices={choices}
          wish={wish}
          onChange={change}
          patient={patient}
          onPatient={(one) => {
            setPatient(one);
            setChosen({});
          }}
          today={today}
          errorOf={errorOf}
        />
        <Button kind="primary" size="wide" type="submit" disabled={!isAwake} busy={book.isPending}>
          {isShown
            ? `Book ${proposal.data.visits.length === 1 ? "the visit" : `all ${proposal.data.visits.length} visits`}`
            : "Book the course"}
        </Button>
        <p className="small soft">
          All of them are booked, or none. The patient gets one message with every visit.
        </p>
      </form>
      <section className="courselist" aria-labelledby="course-visits-head">
        <SectionHead id="course-visits-head" title="The visits" />
        {proposal.error && query !== null && (
          <AlertLine tone="danger" live>
            {problemItems(proposal.error)[0]?.message}
          </AlertLine>
        )}
        {query === null && (
          <EmptyState title="Say what the course is to be.">
            Each visit comes here with whether its time is free, and what to take instead where it is not.
          </EmptyState>
        )}
        {query !== null && proposal.isPending && <Skeleton lines={8} label="Looking at each visit" />}
        {isShown && (
          <ProposedVisits
            proposal={proposal.data}
            chosen={chosen}
            onChoose={setChosen}
            errorOf={errorOf}
            isLooking={proposal.isFetching}
          />
        )}
      </section>
    </Page>
  );
}
