import { newId } from "@withy/core/ids";
import { apiKeys, putAsideItems, savedViews } from "@withy/db/schema";
import type { TestPractice } from "../../support/practice";

/** Something put aside, a view kept and a key for another program, all the owner's. */
export async function writeDesk({ practiceId, db, clock, staff }: TestPractice) {
  const now = clock.now();
  const own = { practiceId, staffMemberId: staff.owner.id };
  const item = { ...own, id: newId(), kind: "booking" as const, title: "A booking" };
  await db.insert(putAsideItems).values({ ...item, typed: { fields: {} }, putAsideAt: now });
  const view = { ...own, id: newId(), name: "Rooms", address: "/diary?by=room" };
  await db.insert(savedViews).values({ ...view, createdAt: now });
  const keyHash = Buffer.from(newId().replaceAll("-", "").repeat(2), "hex");
  const apiKey = { practiceId, id: newId(), name: "Trial", keyHash };
  await db.insert(apiKeys).values({ ...apiKey, createdAt: now, createdBy: staff.owner.id });
  return { apiKeyId: apiKey.id, itemId: item.id, viewId: view.id };
}
