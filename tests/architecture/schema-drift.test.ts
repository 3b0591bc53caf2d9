import { cpSync, mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join, relative } from "node:path";
import { expect, test } from "vitest";
import { run } from "../../scripts/processes.mjs";
import { root } from "../../scripts/settings.mjs";

test("the migrations say what the schema says: nothing is left to generate", async () => {
  const folder = mkdtempSync(join(tmpdir(), "withy-drift-"));
  try {
    cpSync(join(root, "packages/db/migrations"), join(folder, "migrations"), { recursive: true });
    const cwd = join(root, "packages/db");
    const config = join(folder, "drizzle.config.json");
    // drizzle-kit puts "./" before the output folder, whatever it is.
    const out = relative(cwd, join(folder, "migrations"));
    const schema = join(root, "packages/db/src/schema/index.ts");
    writeFileSync(config, JSON.stringify({ dialect: "mysql", schema, out }));
    const output = await run(
      process.execPath,
      ["node_modules/drizzle-kit/bin.cjs", "generate", `--config=${config}`],
      {
        cwd,
      },
    );
    expect(output).toContain("No schema changes");
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}, 60_000);
