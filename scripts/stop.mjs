import { endRecorded, findRunning, forgetRunning } from "./processes.mjs";
import { main } from "./progress.mjs";
import { readSettings } from "./settings.mjs";

await main(async () => {
  const { dataDir } = readSettings();
  const running = findRunning(dataDir);
  if (running.length === 0) {
    console.log(`Nothing of ${dataDir} is running.`);
  } else {
    // A start that still lives stops its own programs in order; what it leaves is ended one by one.
    await endRecorded(running.slice(0, 1), 45_000);
    await endRecorded(running.slice(1));
    console.log(`Stopped ${running.map(({ name }) => name).join(", ")}.`);
  }
  forgetRunning(dataDir);
});
