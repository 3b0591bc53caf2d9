import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { openLiveInbox } from "./live-inbox";

const change = (id: string) => ({ id });

describe("the inbox of a live stream", () => {
  it("takes a change once, also within one delivery", () => {
    const inbox = openLiveInbox();
    expect(inbox.take([change("a"), change("b"), change("a")])).toEqual([change("a"), change("b")]);
    expect(inbox.take([change("b"), change("c")])).toEqual([change("c")]);
    expect(inbox.take([])).toEqual([]);
  });

  it("forgets only what lies further back than any replay", () => {
    const inbox = openLiveInbox();
    const many = Array.from({ length: 4001 }, (_, n) => change(String(n)));
    expect(inbox.take(many)).toHaveLength(4001);
    expect(inbox.take([change("4000"), change("1")])).toEqual([]);
    expect(inbox.take([change("0")])).toEqual([change("0")]);
  });

  it("gives each id once whatever the deliveries", () => {
    fc.assert(
      fc.property(fc.array(fc.array(fc.integer({ min: 0, max: 60 }))), (deliveries) => {
        const inbox = openLiveInbox();
        const taken = deliveries.flatMap((ids) => inbox.take(ids.map((id) => change(String(id)))));
        const sent = new Set(deliveries.flat().map(String));
        expect(taken.map(({ id }) => id).sort()).toEqual([...sent].sort());
      }),
    );
  });
});
