import { readSources } from "./source-files";

export interface ApiRoute {
  readonly file: string;
  /** "/api/diary/appointments/[appointmentId]/move". */
  readonly address: string;
  readonly method: string;
  /** The verb behind it; null where the handler is written by hand. */
  readonly verb: string | null;
}

const handler =
  /export (?:const|async function|function) (GET|POST|PUT|PATCH|DELETE)\b(?:\s*=\s*route\(\s*(\w+))?/g;

/** Every handler below the app's api folder. */
export function readRoutes(): ApiRoute[] {
  return readSources(["apps/staff/src/app/api"])
    .filter(({ path }) => path.endsWith("/route.ts"))
    .flatMap(({ path, text }) =>
      [...text.matchAll(handler)].map((match) => ({
        file: path,
        address: path.replace("apps/staff/src/app", "").replace("/route.ts", ""),
        method: match[1] ?? "",
        verb: match[2] ?? null,
      })),
    );
}
