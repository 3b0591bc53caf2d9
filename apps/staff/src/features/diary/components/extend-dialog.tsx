"use client";
import type { CourseView } from "@withy/contracts/diary";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { Dialog } from "@withy/ui/dialog";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { Skeleton } from "@withy/ui/skeleton";
import { TextInput } from "@withy/ui/text-input";
import { useDeferredValue, useState } from "react";
import { problemItems } from "@/api/form-problems";
import { extendCourse } from "../course-client";
import { type Chosen, changesOf, proposalErrors, rhythmWords } from "../course-wish";
import { useCourseAct, useExtension } from "../hooks/use-course";
import { ProposedVisits } from "./proposed-visits";

const readCount = (text: string) => (/^\s*([1-9]|[1-5]\d|60)\s*$/.test(text) ? Number(text) : null);
const toId = (field: string) =>
  field.startsWith("changes.") ? `visit-${field.slice(8)}` : `extend-${field}`;

/** More visits at the end of a course, each shown as it would stand before any is booked. */
export function ExtendDialog({ course, onClose }: { course: CourseView; onClose: () => void }) {
  const [text, setText] = useState("2");
  const [chosen, setChosen] = useState<Chosen>({});
  const [missing, setMissing] = useState<FieldError[]>([]);
  const [attempt, setAttempt] = useState(0);
  const visits = readCount(text);
  const proposal = useExtension(course.id, useDeferredValue(visits));
  const extend = useCourseAct(
    extendCourse,
    (view) => view,
    (view, input) => `${input.visits} more visits booked for ${view.patient.name}`,
  );
  const refused = extend.error && missing.length === 0 ? problemItems(extend.error, toId) : [];
  const errors = missing.length > 0 ? missing : refused;
  const errorOf = (id: string) => errors.find((error) => error.id === id)?.message;
  const submit = () => {
    const found: FieldError[] =
      visits === null ? [{ id: "extend-visits", message: "Enter how many visits, from 1 to 60" }] : [];
    if (found.length === 0 && proposal.data) found.push(...proposalErrors(proposal.data, chosen));
    setMissing(found);
    setAttempt((n) => n + 1);
    if (found.length > 0 || visits === null || !proposal.data) return;
    const input = { courseId: course.id, version: course.version, visits, changes: changesOf(chosen) };
    extend.mutate(input, { onSuccess: onClose });
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      size="wide"
      title={`More visits for ${course.patient.name}`}
      lead={`They follow the last one, ${rhythmWords(course.rhythm)} at ${course.startTime}.`}
      actions={
        <Button kind="primary" busy={extend.isPending} type="submit" form="extend-form">
          Book {visits === 1 ? "1 visit" : `${visits ?? "the"} visits`}
        </Button>
      }
    >
      <form
        id="extend-form"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <ErrorSummary errors={errors} attempt={`${attempt} ${extend.submittedAt} ${extend.failureCount}`} />
        <TextInput
          id="extend-visits"
          label="How many more"
          inputMode="numeric"
          span="short"
          value={text}
          onChange={(event) => {
            setText(event.target.value);
            setChosen({});
          }}
          error={errorOf("extend-visits")}
        />
        {proposal.error && visits !== null && (
          <AlertLine tone="danger" live>
            {problemItems(proposal.error)[0]?.message}
          </AlertLine>
        )}
        {visits !== null && proposal.isPending && <Skeleton lines={3} label="Looking at each visit" />}
        {visits !== null && proposal.data && (
          <ProposedVisits
            proposal={proposal.data}
            chosen={chosen}
            onChoose={setChosen}
            errorOf={errorOf}
            isLooking={proposal.isFetching}
          />
        )}
      </form>
    </Dialog>
  );
}
