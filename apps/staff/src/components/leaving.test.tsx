import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { ForgetCopies } from "./forget-copies";
import { joinLeaving, useLeaving, type Writer } from "./leaving";
import { PersonId } from "./person-id";
import { hasCopies, keepCopy, readCopy } from "./unsent-copy";

const copy = { version: 3, body: { plan: "Walk" }, keptAt: "2026-12-01T10:40:00.000Z" };
const mine = { personId: "nia", noteId: "n1" };
const go = vi.fn();
let stay: () => void = () => undefined;

function SignOut() {
  const { leave, question } = useLeaving(go);
  return (
    <>
      <button type="button" onClick={leave}>
        Sign out
      </button>
      {question}
    </>
  );
}

function pressSignOut(personId = "nia") {
  render(
    <PersonId id={personId}>
      <SignOut />
    </PersonId>,
  );
  fireEvent.click(screen.getByRole("button", { name: "Sign out" }));
}

function writing(isSaved: boolean): Writer {
  const writer = { flush: vi.fn(async () => isSaved), abandon: vi.fn() };
  stay = joinLeaving(writer);
  return writer;
}

afterEach(() => {
  cleanup();
  stay();
  go.mockReset();
  window.localStorage.clear();
});

describe("text of a note that this browser keeps", () => {
  it("is shown to whoever wrote it and to nobody else", () => {
    keepCopy(mine, copy);
    expect(readCopy(mine)).toEqual(copy);
    expect(readCopy({ ...mine, personId: "tomasz" })).toBeNull();
    expect(hasCopies("tomasz")).toBe(false);
  });

  it("is gone once a sign-out has ended, by whatever way, and other settings stay", () => {
    keepCopy(mine, copy);
    keepCopy({ personId: "tomasz", noteId: "n2" }, copy);
    window.localStorage.setItem("withy.theme", "dark");
    render(<ForgetCopies />);
    expect(Object.keys(window.localStorage)).toEqual(["withy.theme"]);
  });
});

describe("signing out", () => {
  it("saves what is being written first, then leaves and keeps nothing", async () => {
    const writer = writing(true);
    pressSignOut();
    await waitFor(() => expect(go).toHaveBeenCalledOnce());
    expect(writer.flush).toHaveBeenCalledOnce();
    expect(writer.abandon).toHaveBeenCalledOnce();
  });

  it("removes a colleague's text without a question: it is not this person's to save", async () => {
    keepCopy(mine, copy);
    pressSignOut("tomasz");
    await waitFor(() => expect(go).toHaveBeenCalledOnce());
    expect(readCopy(mine)).toBeNull();
  });

  it.each([
    ["a page that cannot save", () => writing(false)],
    ["a copy of another note", () => keepCopy(mine, copy)],
  ])("asks before text is lost: %s", async (_, given) => {
    given();
    pressSignOut();
    fireEvent.click(await screen.findByRole("button", { name: /Stay signed in/ }));
    expect(go).not.toHaveBeenCalled();
    await waitFor(() => expect(screen.queryByRole("dialog")).toBeNull());
    fireEvent.click(screen.getByRole("button", { name: "Sign out" }));
    fireEvent.click(await screen.findByRole("button", { name: "Sign out and lose it" }));
    await waitFor(() => expect(go).toHaveBeenCalledOnce());
    expect(hasCopies("nia")).toBe(false);
  });
});
