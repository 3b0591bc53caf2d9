import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { ShortcutProvider, useShortcut, useShortcuts } from "./shortcut-provider";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }) }));

afterEach(() => {
  cleanup();
  window.localStorage.clear();
});

const seen: ReturnType<typeof useShortcuts>["on"][] = [];

function Screen({ onBook, onDialogBook }: { onBook: () => void; onDialogBook: () => void }) {
  const { on, areOn, switchKeys } = useShortcuts();
  const [isOpen, setOpen] = useState(false);
  seen.push(on);
  useShortcut("book", onBook);
  return (
    <>
      <button type="button" onClick={() => switchKeys(!areOn)}>
        {areOn ? "Keys off" : "Keys on"}
      </button>
      <button type="button" onClick={() => setOpen(!isOpen)}>
        Sheet
      </button>
      {isOpen && <Sheet onBook={onDialogBook} />}
    </>
  );
}

function Sheet({ onBook }: { onBook: () => void }) {
  useShortcut("book", onBook);
  return null;
}

const pressB = () => fireEvent.keyDown(document.body, { key: "b" });

describe("shortcuts of a screen", () => {
  it("belong to what opened last, also after single keys went off and on again", async () => {
    const onBook = vi.fn();
    const onDialogBook = vi.fn();
    render(
      <ShortcutProvider>
        <Screen onBook={onBook} onDialogBook={onDialogBook} />
      </ShortcutProvider>,
    );
    pressB();
    expect(onBook).toHaveBeenCalledTimes(1);
    await act(async () => screen.getByRole("button", { name: "Sheet" }).click());
    await act(async () => screen.getByRole("button", { name: "Keys off" }).click());
    pressB();
    expect(onDialogBook).not.toHaveBeenCalled();
    await act(async () => screen.getByRole("button", { name: "Keys on" }).click());
    pressB();
    expect(onDialogBook).toHaveBeenCalledTimes(1);
    await act(async () => screen.getByRole("button", { name: "Sheet" }).click());
    pressB();
    expect(onBook).toHaveBeenCalledTimes(2);
    expect(new Set(seen).size).toBe(1);
  });
});
