"use client";
import "../programmes.css";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { timeOf } from "@withy/core/wall-clock";
import { useChanges } from "@withy/ui/recent-changes";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useShortcut } from "@/components/shortcuts/shortcut-provider";
import { handoutAddress } from "../api-client";
import { setEquipmentMissing, setMode } from "../draft-changes";
import { useBuilder } from "../hooks/use-builder";
import type { BuilderSheet } from "../item-actions";
import { BuilderFoot } from "./builder-foot";
import { BuilderHead } from "./builder-head";
import { BuilderMessages } from "./builder-messages";
import { EquationLine } from "./equation-line";
import { HandoutBar } from "./handout-bar";
import { HandoutPreview } from "./handout-preview";
import { ItemHeads } from "./item-heads";
import { ItemList } from "./item-list";
import { VersionLines } from "./version-lines";

const AddExerciseDialog = dynamic(() => import("./add-exercise-dialog").then((m) => m.AddExerciseDialog));
const EquipmentDialog = dynamic(() => import("./equipment-dialog").then((m) => m.EquipmentDialog));
const SessionDialog = dynamic(() => import("./session-dialog").then((m) => m.SessionDialog));
const IssueDialog = dynamic(() => import("./issue-dialog").then((m) => m.IssueDialog));

/** The programme with its clock, and beside it the paper that the patient will hold. */
export function ProgrammeBuilder({ first }: { first: ProgrammeView }) {
  const builder = useBuilder(first);
  const { kept, programme, actions, chosenId } = builder;
  const { announce } = useChanges();
  const [sheet, setSheet] = useState<BuilderSheet>(null);
  const view = kept.seen;
  const close = () => setSheet(null);
  useShortcut("add-exercise", () => setSheet("add"), view.canWrite);
  useShortcut("easier", () => chosenId && actions.climb(chosenId, "easier"), chosenId !== null);
  useShortcut("harder", () => chosenId && actions.climb(chosenId, "harder"), chosenId !== null);
  return (
    <div className="programme">
      <div className="build">
        <BuilderHead
          view={view}
          kept={kept}
          programme={programme}
          onMode={(mode) => kept.change((p) => setMode(p, mode))}
        />
        <EquationLine
          programme={programme}
          age={view.patient.age}
          canWrite={view.canWrite}
          onChange={kept.change}
        />
        <BuilderMessages view={view} kept={kept} ladderSays={builder.ladderSays} />
        <ItemHeads mode={programme.mode} />
        <ItemList programme={programme} chosenId={chosenId} canWrite={view.canWrite} actions={actions} />
        <BuilderFoot programme={programme} canWrite={view.canWrite} onOpen={setSheet} />
        <VersionLines view={view} />
      </div>
      <aside className="paper" aria-label="Handout">
        <HandoutBar view={view} send={kept.send} onGive={() => setSheet("issue")} />
        <HandoutPreview view={view} programme={programme} />
      </aside>
      {sheet === "add" && (
        <AddExerciseDialog
          startRegion={null}
          onAdd={(key) => {
            close();
            builder.add(key);
          }}
          onClose={close}
        />
      )}
      {sheet === "equipment" && (
        <EquipmentDialog
          calledName={view.calledName}
          missing={programme.equipmentMissing}
          onSave={(missing) => {
            kept.change((p) => setEquipmentMissing(p, missing));
            close();
          }}
          onClose={close}
        />
      )}
      {sheet === "session" && (
        <SessionDialog
          title={kept.draft.title}
          programme={programme}
          onRename={kept.rename}
          onChange={kept.change}
          onClose={close}
        />
      )}
      {sheet === "issue" && (
        <IssueDialog
          view={view}
          send={kept.send}
          onIssued={(given) => {
            kept.accept(given);
            close();
            const said = `Version ${given.versionNumber} given to ${given.patient.name}`;
            announce({ at: timeOf(new Date(), given.zone), said });
            window.open(handoutAddress(given.id, given.versionNumber), "_blank", "noopener");
          }}
          onClose={close}
        />
      )}
    </div>
  );
}
