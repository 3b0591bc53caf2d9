"use client";
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
import { type ToastMessage, Toasts } from "./toast";

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

/** The messages on show, and how one comes and goes. */
function useToasts() {
  const [messages, setMessages] = useState<readonly ToastMessage[]>([]);
  const count = useRef(0);
  const show = useCallback((message: Omit<ToastMessage, "id">) => {
    count.current += 1;
    setMessages((list) => [...list, { ...message, id: `toast-${count.current}` }].slice(-3));
  }, []);
  const drop = useCallback((id: string) => setMessages((list) => list.filter((one) => one.id !== id)), []);
  return { messages, show, drop };
}

/** Holds the list of what was done in this window, and shows each new one for a few seconds. */
export function ChangesProvider({ children }: { children: ReactNode }) {
  const { messages, show, drop } = useToasts();
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
        show({ said: `Taken back: ${change.said}` });
      } catch (error) {
        mark(id, "kept");
        show({
          said: error instanceof Error ? error.message : "It could not be taken back. Look at it again.",
        });
      }
    },
    [mark, show],
  );
  const announce = useCallback(
    (announcement: Announcement) => {
      next.current += 1;
      const id = `change-${next.current}`;
      setChanges((list) => [{ ...announcement, id, state: "done" as const }, ...list].slice(0, kept));
      const action = announcement.undo ? { label: "Undo", run: () => void undo(id) } : undefined;
      show({ said: announcement.said, action });
    },
    [show, undo],
  );
  const value = useMemo(() => ({ changes, announce, undo }), [changes, announce, undo]);
  return (
    <Context value={value}>
      {children}
      <Toasts messages={messages} onGone={drop} />
    </Context>
  );
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
