export { addAddendum } from "./add-addendum";
export { dischargeEpisode, reopenEpisode } from "./discharge-episode";
export { getDayList } from "./get-day-list";
export { getEpisode } from "./get-episode";
export { getNote } from "./get-note";
export { listEpisodes } from "./list-episodes";
export { listMeasures } from "./list-measures";
export { countUnsignedNotes, listUnsignedNotes } from "./list-unsigned-notes";
export { openEpisode } from "./open-episode";
export {
  createProgramme,
  getExercise,
  getExerciseLibrary,
  getProgramme,
  issueProgramme,
  listProgrammes,
  type RenderedHandout,
  renderHandout,
  saveProgramme,
} from "./programmes";
export { recordMeasure } from "./record-measure";
export { recordRedFlags } from "./record-red-flags";
export { saveGoals } from "./save-goals";
export { saveNoteDraft } from "./save-note-draft";
export { signNote } from "./sign-note";
export { startNote } from "./start-note";
