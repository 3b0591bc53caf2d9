import { expectAccessible } from "./support/accessible";
import { bookedVisit } from "./support/desk";
import { expect, signIn, test } from "./support/journey";
import { acceptAndMiss, addByApi, addByForm, cancelVisit, offerTo } from "./support/offered-time";

test("a cancelled time is offered to two who wait; one accepts by link, the other is told, the diary has the visit", async ({
  page,
  browser,
}) => {
  test.slow();
  await signIn(page, "reception");
  const visit = await bookedVisit(page);
  const first = await test.step("puts someone on the list from their record", () => addByForm(page, visit));
  const second = await addByApi(page);
  await test.step("cancels a visit", () => cancelVisit(page, visit));
  await test.step("offers its time to the two", () => offerTo(page, visit, [first, second]));
  await test.step("one accepts by link, the other comes too late", () =>
    acceptAndMiss(browser, first, second));
  const round = page.getByRole("article", { name: new RegExp(`${visit.startTime}$`) });
  await expect(round.getByRole("listitem").filter({ hasText: first.name })).toContainText("Accepted");
  await expect(round.getByRole("listitem").filter({ hasText: second.name })).toContainText("gone");
  await expect(page.getByRole("row").filter({ hasText: second.name })).toBeVisible();
  await expectAccessible(page);
  await round.getByRole("link", { name: "Taken: open the visit" }).click();
  const cell = page.getByRole("gridcell", {
    name: new RegExp(`^${visit.startTime} to .+, ${first.name},.+Booked$`),
  });
  await expect(cell).toBeVisible();
});
