"use client";
import { Button, ButtonLink, Buttons } from "@withy/ui/button";
import { ErrorSummary, type FieldError } from "@withy/ui/error-summary";
import { PageBody } from "@withy/ui/page";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { useOpenEpisode } from "../hooks/use-open-episode";
import { useStartNote } from "../hooks/use-start-note";
import { emptyEpisode, episodeFrom, problemsIn } from "../typed-episode";
import { EpisodeFields } from "./episode-fields";
import { RecordTitle } from "./record-title";

export interface OpenEpisodeFormProps {
  patientId: string;
  sites: readonly { id: string; name: string }[];
  deskSiteId: string;
  /** The visit that it is opened for: its note is begun at once. */
  visitId: string | null;
}

/** Opens a course of care: where, which side, what for. */
export function OpenEpisodeForm({ patientId, sites, deskSiteId, visitId }: OpenEpisodeFormProps) {
  const router = useRouter();
  const open = useOpenEpisode();
  const start = useStartNote();
  const isAwake = useAwake();
  const desk = sites.find((site) => site.id === deskSiteId) ?? sites[0];
  const [typed, setTyped] = useState(() => emptyEpisode(desk?.id ?? ""));
  const [refused, setRefused] = useState<{ errors: FieldError[]; attempt: number }>({
    errors: [],
    attempt: 0,
  });
  const failed = open.error ?? start.error;
  const errors = refused.errors.length > 0 ? refused.errors : failed ? problemItems(failed) : [];
  const submit = () => {
    const found = problemsIn(typed);
    setRefused(({ attempt }) => ({ errors: found, attempt: attempt + 1 }));
    const input = episodeFrom(typed, { patientId, visitId });
    if (found.length > 0 || input === null) return;
    open.mutate(input, {
      onSuccess: (episode) =>
        visitId === null
          ? router.push(`/patients/${patientId}/episodes/${episode.id}`)
          : start.mutate({ appointmentId: visitId, episodeId: episode.id }),
    });
  };
  return (
    <>
      <RecordTitle title="Open an episode" aside="one problem, from first visit to discharge" />
      <PageBody>
        <form
          className="episode-form"
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            submit();
          }}
        >
          <ErrorSummary errors={errors} attempt={refused.attempt + open.submittedAt} />
          <EpisodeFields
            typed={typed}
            sites={sites}
            onChange={(change) => setTyped((before) => ({ ...before, ...change }))}
            problem={(id) => errors.find((error) => error.id === id)?.message}
          />
          <Buttons>
            <Button kind="primary" type="submit" disabled={!isAwake} busy={open.isPending || start.isPending}>
              {visitId === null ? "Open the episode" : "Open it and write the note"}
            </Button>
            <ButtonLink as={Link} href={`/patients/${patientId}/episodes`}>
              Leave it
            </ButtonLink>
          </Buttons>
        </form>
      </PageBody>
    </>
  );
}
