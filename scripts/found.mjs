import { findRunning } from "./processes.mjs";
import { main, StartError } from "./progress.mjs";
import { appEnvironment, readSecrets, readSettings } from "./settings.mjs";
import { runTypeScript } from "./stack.mjs";

const usage =
  'npm run found -- --name "Marram Physiotherapy" --site Saltgate --given Ingrid --family Solheim --email owner@marram.example --prefix MP';

/** Founds a practice on the running installation and prints the link with which its owner sets a password. */
await main(async () => {
  const settings = readSettings();
  const args = process.argv.slice(2);
  if (args.length === 0) throw new StartError(`Say who the practice is:\n\n  ${usage}`);
  if (!findRunning(settings.dataDir).some(({ name }) => name === "database")) {
    throw new StartError(
      "Withy is not running from this folder. Use npm start first, then found the practice.",
    );
  }
  const env = appEnvironment(settings, readSecrets(settings.dataDir));
  const file = "../services/src/practices/found-practice-command.ts";
  const link = await runTypeScript("packages/db", file, {
    env,
    args,
    failure: "The practice was not founded:",
  });
  console.log(
    `The owner sets a password here, once, within the time that the page says:\n\n  ${link.trim()}`,
  );
});
