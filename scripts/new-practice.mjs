import { spawnSync } from "node:child_process";
import { join } from "node:path";
import { main } from "./progress.mjs";
import { appEnvironment, readSecrets, readSettings, root } from "./settings.mjs";

const usage = `Lays down a new practice in a running installation and prints the link by which its owner sets a password.

  npm run new-practice -- --name "Name of the practice" --site "First site" --given Ada --family Fenn \\
    --email ada@practice.example --prefix AF
`;

main(async () => {
  if (process.argv.length < 3) {
    console.log(usage);
    return;
  }
  const settings = readSettings();
  const { status } = spawnSync(
    process.execPath,
    ["--import", "tsx", "src/practices/found-practice-command.ts", ...process.argv.slice(2)],
    {
      cwd: join(root, "packages/services"),
      env: appEnvironment(settings, readSecrets(settings.dataDir)),
      stdio: "inherit",
    },
  );
  process.exitCode = status ?? 1;
});
