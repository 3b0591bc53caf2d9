export const noteStates = ["draft", "signed"] as const;
export type NoteState = (typeof noteStates)[number];

/** What may be done with a note, and the state it leads to. */
export const noteMoves: Record<NoteState, Readonly<Partial<Record<NoteAct, NoteState>>>> = {
  draft: { write: "draft", sign: "signed" },
  signed: { addendum: "signed" },
};

export type NoteAct = "write" | "sign" | "addendum";

export const noteStateLabels: Record<NoteState, string> = { draft: "Draft", signed: "Signed" };
