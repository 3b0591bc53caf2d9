import type { RenderedEmail } from "@withy/documents/message/email";
import type { SystemContext } from "../context";
import type { OutboxRow } from "./claim-messages";

export interface PostOffice {
  /** The app's address, put before the paths of links. */
  readonly appUrl: string;
}

/** Null where the message is no longer true and must not go: the visit was moved or cancelled since. */
export type Renderer = (
  ctx: SystemContext,
  row: OutboxRow,
  office: PostOffice,
) => Promise<RenderedEmail | null>;

/** The app's address with a path of ours behind it. */
export function linkTo(office: PostOffice, path: string): string {
  return new URL(path, `${office.appUrl.replace(/\/+$/, "")}/`).toString();
}
