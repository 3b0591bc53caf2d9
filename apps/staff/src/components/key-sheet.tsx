"use client";
import { Dialog } from "@withy/ui/dialog";
import { SectionHead } from "@withy/ui/section-head";
import { keyWords, type Shortcut, shortcuts } from "./shortcuts/shortcut-table";

/** Every key, from the same table that handles them. */
export function KeySheet({ permissions, onClose }: { permissions: readonly string[]; onClose: () => void }) {
  const allowed = (shortcuts as readonly Shortcut[]).filter(
    (s) => !s.permission || permissions.includes(s.permission),
  );
  const groups = [...new Set(allowed.map((s) => s.group))];
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="All keys"
      lead="Single keys rest while you type. You can switch them off in your own menu."
      place="centre"
      size="wide"
      closeLabel="Close"
    >
      <div className="keysheet">
        {groups.map((group) => (
          <section key={group}>
            <SectionHead title={group} />
            <dl>
              {allowed
                .filter((s) => s.group === group)
                .map((s) => (
                  <div key={s.id} className="keyline">
                    <dt>{s.label}</dt>
                    <dd>
                      <kbd>{keyWords(s.keys)}</kbd>
                    </dd>
                  </div>
                ))}
            </dl>
          </section>
        ))}
      </div>
    </Dialog>
  );
}
