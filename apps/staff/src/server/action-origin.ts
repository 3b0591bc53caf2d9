import "server-only";
import { headers } from "next/headers";
import { checkOrigin } from "./run-route";

/** The request's headers, once it is known that it came from our own pages: a form can be posted from anywhere. */
export async function checkActionOrigin(): Promise<Headers> {
  const sent = new Headers(await headers());
  checkOrigin(new Request("http://withy.invalid", { headers: sent }));
  return sent;
}
