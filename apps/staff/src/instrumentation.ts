/** Checks the settings before the first request, so that a wrong one stops the start and says so. */
export async function register() {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { refuseUnsafeStart } = await import("./server/refuse-unsafe-start");
  await refuseUnsafeStart();
}
