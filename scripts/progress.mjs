/** A failure that the reader can do something about: shown as a sentence, without a stack. */
export class StartError extends Error {}

export const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`;

/** Says what is being done, does it, and says how long it took. `work` may return words to add to the line. */
export async function step(what, work) {
  const since = performance.now();
  process.stdout.write(`  ${what} `);
  try {
    const note = await work();
    console.log(`${note ? `(${note}) ` : ""}${seconds(since)}`);
  } catch (error) {
    console.log("failed");
    throw error;
  }
}

/** Runs a command's main function and turns what it throws into words and an exit code. */
export async function main(work) {
  try {
    await work();
  } catch (error) {
    console.error(`\n${error instanceof StartError ? error.message : error.stack}`);
    process.exitCode = 1;
  }
}
