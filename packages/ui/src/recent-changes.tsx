"use client";
import { Toast } from "@base-ui/react/toast";
import {
  createContext,
  type ReactNode,
  useCallback,
  useContext,
  useEffect,
  useMemo,
  useRef,
  useState,
} from "react";

export interface Change {
  id: string;
  /** "10:44", already in the site's time. */
  at: string;
  /** One past-tense sentence: what was done to what. */
  said: string;
  /** Takes it back. Absent where something else already depends on it. */
  undo?: () => Promise<void>;
  state: "done" | "undoing" | "undone" | "kept";
}

export interface Announcement {
  at: string;
  said: string;
  undo?: () => Promise<void>;
}

interface Changes {
  changes: readonly Change[];
  announce: (announcement: Announcement) => void;
  undo: (id: string) => Promise<void>;
}

const Context = createContext<Changes | null>(null);
const kept = 50;

/** Holds the list of what was done in this window, and shows each new one for a few seconds. */
export function ChangesProvider({ children }: { children: ReactNode }) {
  return (
    <Toast.Provider timeout={8000}>
      <ChangeList>{children}</ChangeList>
      <Toast.Portal>
        <Toast.Viewport className="toasts">
          <Toasts />
        </Toast.Viewport>
      </Toast.Portal>
    </Toast.Provider>
  );
}

function ChangeList({ children }: { children: ReactNode }) {
  const { add } = Toast.useToastManager();
  const [changes, setChanges] = useState<readonly Change[]>([]);
  const current = useRef(changes);
  useEffect(() => {
    current.current = changes;
  }, [changes]);
  const next = useRef(0);

  const mark = useCallback((id: string, state: Change["state"]) => {
    setChanges((list) => list.map((change) => (change.id === id ? { ...change, state } : change)));
  }, []);
  const undo = useCallback(
    async (id: string) => {
      const change = current.current.find((one) => one.id === id);
      if (!change?.undo || change.state !== "done") return;
      mark(id, "undoing");
      try {
        await change.undo();
        mark(id, "undone");
        add({ title: `Taken back: ${change.said}` });
      } catch (error) {
        mark(id, "kept");
        add({
          title: error instanceof Error ? error.message : "It could not be taken back. Look at it again.",
          priority: "high",
        });
      }
    },
    [add, mark],
  );
  const announce = useCallback(
    (announcement: Announcement) => {
      next.current += 1;
      const id = `change-${next.current}`;
      setChanges((list) => [{ ...announcement, id, state: "done" as const }, ...list].slice(0, kept));
      const action = announcement.undo
        ? { actionProps: { children: "Undo", onClick: () => void undo(id) } }
        : {};
      add({ title: announcement.said, ...action });
    },
    [add, undo],
  );
  const value = useMemo(() => ({ changes, announce, undo }), [changes, announce, undo]);
  return <Context value={value}>{children}</Context>;
}

function Toasts() {
  const { toasts } = Toast.useToastManager();
  return toasts.map((toast) => (
    <Toast.Root key={toast.id} toast={toast} className="toast lifted">
      <Toast.Title render={<span />} />
      <Toast.Action className="btn" data-kind="plain" data-size="small" />
    </Toast.Root>
  ));
}

/** What was done here, newest first, and the way to say that something was done. */
export function useChanges(): Changes {
  const value = useContext(Context);
  if (!value) throw new Error("useChanges needs a ChangesProvider above it.");
  return value;
}

const stateWords: Record<Change["state"], string> = {
  done: "",
  undoing: "Taking back",
  undone: "Taken back",
  kept: "Could not be undone",
};

/** The permanent list: a message that has gone can still be read and undone here. */
export function RecentChanges({ empty = "Nothing was changed here yet." }: { empty?: string }) {
  const { changes, undo } = useChanges();
  if (changes.length === 0) return <p className="soft small">{empty}</p>;
  return (
    <ol className="recent">
      {changes.map((change) => (
        <li key={change.id}>
          <span className="num soft">{change.at}</span>
          <span>{change.state === "undone" ? <s>{change.said}</s> : change.said}</span>
          {change.undo && change.state === "done" ? (
            <button
              type="button"
              className="btn"
              data-kind="plain"
              data-size="small"
              onClick={() => void undo(change.id)}
            >
              Undo<span className="vh">: {change.said}</span>
            </button>
          ) : (
            <span className="soft small">{stateWords[change.state]}</span>
          )}
        </li>
      ))}
    </ol>
  );
}
