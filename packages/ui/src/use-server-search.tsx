"use client";
import { useEffect, useRef, useState } from "react";

export interface SearchAnswer<Option> {
  state: "idle" | "asking" | "failed" | "answered";
  options: readonly Option[];
}

const pauseMs = 150;

/** Asks the server a moment after the last keystroke; a newer question cancels the older one. */
export function useServerSearch<Option>(
  search: (text: string, signal: AbortSignal) => Promise<readonly Option[]>,
  from: number,
) {
  const [answer, setAnswer] = useState<SearchAnswer<Option>>({ state: "idle", options: [] });
  const running = useRef<AbortController | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const stop = () => {
    clearTimeout(timer.current);
    running.current?.abort();
  };
  useEffect(
    () => () => {
      clearTimeout(timer.current);
      running.current?.abort();
    },
    [],
  );
  const ask = (text: string) => {
    stop();
    if (text.trim().length < from) return setAnswer({ state: "idle", options: [] });
    const controller = new AbortController();
    running.current = controller;
    setAnswer((before) => ({ state: "asking", options: before.options }));
    timer.current = setTimeout(() => {
      search(text.trim(), controller.signal).then(
        (options) => !controller.signal.aborted && setAnswer({ state: "answered", options }),
        () => !controller.signal.aborted && setAnswer({ state: "failed", options: [] }),
      );
    }, pauseMs);
  };
  return { answer, ask };
}
