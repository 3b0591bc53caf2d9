"use client";
import type { LastRest, Programme } from "@withy/clinical/programmes/programme";
import { Dialog } from "@withy/ui/dialog";
import { Select } from "@withy/ui/select";
import { TextArea, TextInput } from "@withy/ui/text-input";
import { NumberBox } from "./number-box";

const lastRestOptions = [
  { value: "kept", label: "Counts: the session ends with a rest" },
  { value: "dropped", label: "Does not count: the session ends with work" },
];

/** The programme's name, the finer timing, and what to say to the patient. Changes apply as they are made. */
export function SessionDialog({
  title,
  programme,
  onRename,
  onChange,
  onClose,
}: {
  title: string;
  programme: Programme;
  onRename: (title: string) => void;
  onChange: (update: (programme: Programme) => Programme) => void;
  onClose: () => void;
}) {
  const between = programme.mode === "timed" ? "restBetweenRoundsSeconds" : "restBetweenItemsSeconds";
  const betweenWords =
    programme.mode === "timed" ? "seconds of rest between rounds" : "seconds between exercises";
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Name, timing and advice"
      closeLabel="Done"
    >
      <TextInput
        id="programme-title"
        label="Name of the programme"
        value={title}
        maxLength={120}
        error={title.trim() === "" ? "Give the programme a name." : undefined}
        onChange={(event) => onRename(event.currentTarget.value)}
      />
      <p className="num between">
        <NumberBox
          label={betweenWords}
          className="number-box small"
          value={programme[between]}
          onChange={(value) => onChange((p) => ({ ...p, [between]: value }))}
        />{" "}
        {betweenWords}
      </p>
      {programme.mode === "timed" && (
        <Select
          id="last-rest"
          label="The very last rest"
          options={lastRestOptions}
          value={programme.lastRest}
          onChange={(event) => {
            const lastRest = event.currentTarget.value as LastRest;
            onChange((p) => ({ ...p, lastRest }));
          }}
        />
      )}
      <TextArea
        id="programme-advice"
        label="Advice on the handout"
        hint="In plain words, for example what to do on the other days."
        value={programme.advice}
        maxLength={1000}
        onChange={(event) => {
          const advice = event.currentTarget.value;
          onChange((p) => ({ ...p, advice }));
        }}
      />
    </Dialog>
  );
}
