"use client";
import { AlertLine } from "@withy/ui/alert-line";
import { usePresence } from "../hooks/use-presence";

function listed(names: readonly string[]): string {
  const last = names.at(-1) ?? "";
  return names.length < 2 ? last : `${names.slice(0, -1).join(", ")} and ${last}`;
}

const has = (names: readonly string[], one: string, many: string) =>
  `${listed(names)} ${names.length === 1 ? one : many}`;

/** Who else has the appointment open, so that two people do not change it at once. */
export function PresenceLine({ appointmentId, isEditing }: { appointmentId: string; isEditing: boolean }) {
  const others = usePresence(appointmentId, isEditing);
  const editing = others.filter((one) => one.isEditing).map((one) => one.name);
  const looking = others.filter((one) => !one.isEditing).map((one) => one.name);
  return (
    <div className="presence" role="status">
      {editing.length > 0 && (
        <AlertLine>{has(editing, "is changing this now.", "are changing this now.")}</AlertLine>
      )}
      {looking.length > 0 && (
        <p className="small soft">{has(looking, "has this open too.", "have this open too.")}</p>
      )}
    </div>
  );
}
