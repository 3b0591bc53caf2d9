import AxeBuilder from "@axe-core/playwright";
import { expect, type Page } from "@playwright/test";

const grave = new Set(["serious", "critical"]);

/** No serious or critical finding on the page as it stands, in light and in dark. */
export async function expectAccessible(page: Page): Promise<void> {
  for (const colorScheme of ["light", "dark"] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: "reduce" });
    // A colour that is still on its way from light to dark is neither of the two.
    await page.evaluate(() => Promise.allSettled(document.getAnimations().map(({ finished }) => finished)));
    const axe = new AxeBuilder({ page });
    // What the dark can break is colour; all else was looked at in the light.
    if (colorScheme === "dark") axe.withRules(["color-contrast", "link-in-text-block"]);
    const { violations } = await axe.analyze();
    const found = violations
      .filter(({ impact }) => grave.has(impact ?? ""))
      .map(
        ({ id, nodes }) =>
          `${id} at ${nodes
            .map((node) => node.target.join(" "))
            .slice(0, 3)
            .join(", ")}`,
      );
    expect(found, `${page.url()} in ${colorScheme}`).toEqual([]);
  }
  await page.emulateMedia({ colorScheme: null, reducedMotion: null });
}
