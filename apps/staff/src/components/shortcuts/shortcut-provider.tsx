"use client";
import { useRouter } from "next/navigation";
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
import { matchKeys, pressed } from "./match-keys";
import { type ShortcutId, shortcuts } from "./shortcut-table";

type Handler = () => void;

interface Registry {
  /** Registers a handler until the returned function is called; the latest one wins. The same function for good. */
  on(id: ShortcutId, handler: Handler): () => void;
  run(id: ShortcutId): void;
  active(): ReadonlySet<ShortcutId>;
  areOn: boolean;
  switchKeys(on: boolean): void;
}

const Context = createContext<Registry | null>(null);
const storageKey = "withy.single-keys";

/** Listens once for the whole window and gives each shortcut to the screen that handles it. */
export function ShortcutProvider({ children }: { children: ReactNode }) {
  const router = useRouter();
  const handlers = useRef(new Map<ShortcutId, Handler[]>());
  const [areOn, setAreOn] = useState(true);
  useEffect(() => {
    setAreOn(window.localStorage.getItem(storageKey) !== "off");
  }, []);
  const on = useCallback<Registry["on"]>((id, handler) => {
    handlers.current.set(id, [...(handlers.current.get(id) ?? []), handler]);
    return () =>
      handlers.current.set(
        id,
        (handlers.current.get(id) ?? []).filter((h) => h !== handler),
      );
  }, []);
  const registry = useMemo<Registry>(() => {
    const run = (id: ShortcutId) => {
      const handler = handlers.current.get(id)?.at(-1);
      if (handler) return handler();
      const entry = shortcuts.find((s) => s.id === id);
      if (entry && "href" in entry) router.push(entry.href);
    };
    return {
      on,
      run,
      active: () => new Set([...handlers.current].filter(([, list]) => list.length > 0).map(([id]) => id)),
      areOn,
      switchKeys(areNowOn) {
        window.localStorage.setItem(storageKey, areNowOn ? "on" : "off");
        setAreOn(areNowOn);
      },
    };
  }, [router, on, areOn]);
  useEffect(() => {
    const listen = matchKeys({
      areSingleKeysOn: () => areOn,
      has: (id) => (handlers.current.get(id)?.length ?? 0) > 0,
      run: registry.run,
    });
    const onKeyDown = (event: KeyboardEvent) => listen(pressed(event), event);
    window.addEventListener("keydown", onKeyDown);
    return () => window.removeEventListener("keydown", onKeyDown);
  }, [registry, areOn]);
  return <Context value={registry}>{children}</Context>;
}

export function useShortcuts(): Registry {
  const registry = useContext(Context);
  if (!registry) throw new Error("useShortcuts needs a ShortcutProvider above it.");
  return registry;
}

/** Handles one shortcut of the table while the component is shown and `enabled`. */
export function useShortcut(id: ShortcutId, handler: Handler, enabled = true): void {
  const { on } = useShortcuts();
  const latest = useRef(handler);
  useEffect(() => {
    latest.current = handler;
  });
  useEffect(() => (enabled ? on(id, () => latest.current()) : undefined), [on, id, enabled]);
}
