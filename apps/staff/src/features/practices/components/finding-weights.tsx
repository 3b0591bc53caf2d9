"use client";
import type { RankConcern, Weights } from "@withy/diary/rank-time";
import { Button, Buttons } from "@withy/ui/button";
import { ErrorSummary } from "@withy/ui/error-summary";
import { useChanges } from "@withy/ui/recent-changes";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { type FormEvent, useState } from "react";
import { fieldProblem, problemItems } from "@/api/form-problems";
import { ApiError } from "@/api/request";
import { useAwake } from "@/components/use-awake";
import { useChangeFindingWeights } from "../hooks/use-finding-weights";
import { momentWords } from "../moment-words";

const concerns: { id: RankConcern; label: string; hint: string }[] = [
  { id: "wish", label: "The wishes", hint: "Higher: times that break a wish of the caller come later." },
  { id: "wait", label: "The wait", hint: "Higher: sooner times come first. Urgency multiplies it." },
  { id: "knows", label: "The same therapist", hint: "Higher: whoever saw the patient last comes first." },
  {
    id: "day",
    label: "A day without odd gaps",
    hint: "Higher: times that leave no gap too short to sell come first.",
  },
];

const textOf = (weights: Weights): Record<RankConcern, string> => ({
  ...{ wish: String(weights.wish), wait: String(weights.wait) },
  ...{ knows: String(weights.knows), day: String(weights.day) },
});

function theirsOf(error: unknown): Weights | null {
  if (!(error instanceof ApiError) || error.problem.code !== "stale") return null;
  return (error.problem.more.current as Weights | undefined) ?? null;
}

/** What counts, and how much, when times are ranked and the caller has no order of their own. */
export function FindingWeights({ first, zone }: { first: Weights; zone: string }) {
  const { announce } = useChanges();
  const [before, setBefore] = useState(first);
  const [typed, setTyped] = useState(textOf(first));
  const change = useChangeFindingWeights();
  const isAwake = useAwake();
  const theirs = theirsOf(change.error);
  const read = (id: RankConcern) => (typed[id].trim() === "" ? Number.NaN : Number(typed[id]));
  const save = (event: FormEvent) => {
    event.preventDefault();
    const weights = { wish: read("wish"), wait: read("wait"), knows: read("knows"), day: read("day") };
    change.mutate(
      { weights, before: theirs ?? before },
      {
        onSuccess: (saved) => {
          setBefore(saved);
          const at = momentWords(new Date().toISOString(), zone).slice(-5);
          announce({ at, said: "You changed how times are ranked" });
        },
      },
    );
  };
  return (
    <section aria-labelledby="weights-title">
      <SectionHead id="weights-title" title="How times are ranked" />
      <form noValidate className="narrowform" onSubmit={save}>
        {change.error && (
          <ErrorSummary
            title="The weights are not saved yet"
            errors={problemItems(change.error)}
            attempt={change.submittedAt}
          />
        )}
        {theirs && (
          <p className="note">
            Saved meanwhile: {concerns.map(({ id, label }) => `${label} ${theirs[id]}`).join(", ")}. Save
            again to put yours in their place.
          </p>
        )}
        {concerns.map(({ id, label, hint }) => (
          <TextInput
            key={id}
            id={`weights.${id}`}
            label={label}
            hint={hint}
            span="short"
            inputMode="numeric"
            value={typed[id]}
            onChange={(event) => setTyped({ ...typed, [id]: event.target.value })}
            error={fieldProblem(change.error, `weights.${id}`)}
          />
        ))}
        <p className="small soft">
          Whole numbers from 0 to 100. What matters is how they stand to each other.
        </p>
        <Buttons>
          <Button kind="primary" type="submit" disabled={!isAwake} busy={change.isPending}>
            Save weights
          </Button>
        </Buttons>
      </form>
    </section>
  );
}
