/** Checks the settings before the first request, so that a wrong one stops the start and says so. */
export async function register() {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { refuseUnsafeStart } = await import("./server/refuse-unsafe-start");
  await refuseUnsafeStart();
}

/** Logs a failed page without what a person typed. */
export async function onRequestError(error: unknown, request: { path: string; method: string }) {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const [{ log }, { describe }] = await Promise.all([import("./server/log"), import("./server/run-route")]);
  log.error(
    { method: request.method, path: request.path.split("?")[0], error: describe(error) },
    "page failed",
  );
}
