import type { NoteView } from "@withy/contracts/clinical";

/**
 * The later of what this window holds and what a page was rendered with. The back button brings a page as it was
 * rendered long ago; a page that is opened anew may know of changes from elsewhere.
 */
export function newerNote(held: NoteView, rendered: NoteView): NoteView {
  if (held.version !== rendered.version) return held.version > rendered.version ? held : rendered;
  if (held.addenda.length !== rendered.addenda.length) {
    return held.addenda.length > rendered.addenda.length ? held : rendered;
  }
  return held.episode.version >= rendered.episode.version ? held : rendered;
}
