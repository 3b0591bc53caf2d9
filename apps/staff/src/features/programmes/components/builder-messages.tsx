"use client";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { plainDateWords } from "@withy/core/date-words";
import { dayOf } from "@withy/core/wall-clock";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import dynamic from "next/dynamic";
import { useEffect, useState } from "react";
import type { ProgrammeDraft } from "../hooks/use-programme-draft";

const ClashDialog = dynamic(() => import("./clash-dialog").then((m) => m.ClashDialog));

/** What must be read before going on: a wrong number, a failed save, another person's save, a version given out. */
export function BuilderMessages({
  view,
  kept,
  ladderSays,
}: {
  view: ProgrammeView;
  kept: ProgrammeDraft;
  ladderSays: string | null;
}) {
  const isClash = kept.failure?.isClash === true;
  const [isLater, setLater] = useState(false);
  useEffect(() => {
    if (!isClash) setLater(false);
  }, [isClash]);
  const given = view.versions.find((line) => line.versionNumber === view.versionNumber)?.issuedAt ?? null;
  const givenOn = given === null ? "" : plainDateWords(dayOf(new Date(given), view.zone));
  return (
    <div className="messages">
      {!view.canWrite && !view.episode.isOpen && (
        <AlertLine>This episode of care has ended. Open it again to change its exercises.</AlertLine>
      )}
      {view.canWrite && given !== null && kept.state === "saved" && (
        <p className="note">
          {view.calledName} has had this version since {givenOn}. A change begins version{" "}
          {view.versionNumber + 1}.
        </p>
      )}
      {kept.problem && <AlertLine tone="danger">{kept.problem.message}</AlertLine>}
      {ladderSays && <AlertLine live>{ladderSays}</AlertLine>}
      {kept.failure && !isClash && (
        <AlertLine tone="danger" live>
          {kept.failure.message}{" "}
          <Button size="small" onClick={() => void kept.send()}>
            Save again
          </Button>
        </AlertLine>
      )}
      {isClash && isLater && (
        <AlertLine tone="danger">
          Someone else saved this programme. Your changes stand here and are not saved.{" "}
          <Button size="small" onClick={() => setLater(false)}>
            Decide
          </Button>
        </AlertLine>
      )}
      {isClash && !isLater && (
        <ClashDialog
          message={kept.failure?.message ?? ""}
          onTake={() => void kept.takeTheirs()}
          onKeep={() => void kept.keepMine()}
          onLater={() => setLater(true)}
        />
      )}
    </div>
  );
}
