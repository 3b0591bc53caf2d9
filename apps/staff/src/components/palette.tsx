"use client";
import { useQuery } from "@tanstack/react-query";
import { Command } from "cmdk";
import { useRouter } from "next/navigation";
import { useDeferredValue, useState } from "react";
import { findPatients } from "@/api/find-patients";
import { useShortcuts } from "./shortcuts/shortcut-provider";
import { keyWords, type Shortcut, type ShortcutId, shortcuts } from "./shortcuts/shortcut-table";

/** One line to type in: a patient by any of the five ways, or a command. */
export function Palette({ permissions, onClose }: { permissions: readonly string[]; onClose: () => void }) {
  const router = useRouter();
  const { active, run } = useShortcuts();
  const [text, setText] = useState("");
  const query = useDeferredValue(text.trim());
  const handled = active();
  const mayFind = permissions.includes("patients.read") && query.length >= 2;
  const found = useQuery({
    queryKey: ["palette", query],
    queryFn: ({ signal }) => findPatients(query, signal),
    enabled: mayFind,
  });
  const commands = (shortcuts as readonly Shortcut[]).filter(
    (s) =>
      s.id !== "palette" &&
      s.id !== "search" &&
      (s.href !== undefined || handled.has(s.id as ShortcutId)) &&
      (!s.permission || permissions.includes(s.permission)),
  );
  const matches = commands.filter((s) => s.label.toLowerCase().includes(query.toLowerCase()));
  const choose = (act: () => void) => {
    onClose();
    act();
  };
  return (
    <Command.Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      label="Find a patient or a command"
      className="palette"
      overlayClassName="veil"
      shouldFilter={false}
      loop
    >
      <Command.Input
        value={text}
        onValueChange={setText}
        placeholder="Patient, phone, NHS or invoice number"
        className="input paletteinput"
      />
      <Command.List className="palettelist">
        <Command.Empty className="soft palettenone">
          {found.isFetching
            ? "Looking"
            : "Nothing found. Try the family name, a date of birth or the last digits of the phone."}
        </Command.Empty>
        {found.data && found.data.length > 0 && (
          <Command.Group heading="Patients">
            {found.data.map((p) => (
              <Command.Item
                key={p.id}
                value={p.id}
                className="menuitem"
                onSelect={() => choose(() => router.push(p.href))}
              >
                <b>{p.label}</b>
                <span className="soft grow">{p.detail}</span>
              </Command.Item>
            ))}
          </Command.Group>
        )}
        {matches.length > 0 && (
          <Command.Group heading="Commands">
            {matches.map((s) => (
              <Command.Item
                key={s.id}
                value={s.id}
                className="menuitem"
                onSelect={() => choose(() => run(s.id as ShortcutId))}
              >
                <span className="grow">{s.label}</span>
                <kbd>{keyWords(s.keys)}</kbd>
              </Command.Item>
            ))}
          </Command.Group>
        )}
      </Command.List>
    </Command.Dialog>
  );
}
