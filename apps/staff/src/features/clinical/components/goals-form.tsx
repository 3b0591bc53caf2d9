"use client";
import type { EpisodeView } from "@withy/contracts/clinical";
import { Button, Buttons } from "@withy/ui/button";
import { Check } from "@withy/ui/check";
import { ErrorSummary } from "@withy/ui/error-summary";
import { SectionHead } from "@withy/ui/section-head";
import { TextInput } from "@withy/ui/text-input";
import { useState } from "react";
import { problemItems } from "@/api/form-problems";
import { useAwake } from "@/components/use-awake";
import { saveGoals } from "../api-client";
import { useEpisodeWrite } from "../hooks/use-episode";
import { shortDay } from "../site-time";

/** The patient's goals; a tick says that one is met and keeps the day. */
export function GoalsForm({ episode, canWrite }: { episode: EpisodeView; canWrite: boolean }) {
  const save = useEpisodeWrite(saveGoals);
  const isAwake = useAwake();
  const [text, setText] = useState("");
  const goals = episode.goals.map((goal) => ({ text: goal.text, isMet: goal.metOn !== null }));
  const send = (changed: typeof goals) =>
    save.mutate({ episodeId: episode.id, version: episode.version, goals: changed });
  return (
    <section aria-labelledby="goals-head">
      <SectionHead id="goals-head" title="Goals" />
      <ErrorSummary
        errors={save.error ? problemItems(save.error).map(({ message }) => ({ message })) : []}
        attempt={save.submittedAt}
      />
      <ul className="goals">
        {episode.goals.map((goal, at) => (
          <li key={goal.text}>
            <Check
              checked={goal.metOn !== null}
              disabled={!canWrite || save.isPending}
              onChange={(event) =>
                send(goals.map((g, i) => (i === at ? { ...g, isMet: event.target.checked } : g)))
              }
            >
              {goal.text}
              <span className="soft small num">
                {goal.metOn === null ? ` set ${shortDay(goal.setOn)}` : ` met ${shortDay(goal.metOn)}`}
              </span>
            </Check>
          </li>
        ))}
      </ul>
      {episode.goals.length === 0 && <p className="soft">None set yet.</p>}
      {canWrite && episode.goals.length < 8 && (
        <form
          className="goal-add"
          onSubmit={(event) => {
            event.preventDefault();
            if (text.trim() !== "") send([...goals, { text: text.trim(), isMet: false }]);
          }}
        >
          <TextInput
            id="goal"
            label="Another goal"
            maxLength={300}
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
          <Buttons>
            <Button size="small" type="submit" disabled={!isAwake} busy={save.isPending}>
              Add the goal
            </Button>
          </Buttons>
        </form>
      )}
    </section>
  );
}
