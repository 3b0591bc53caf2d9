export { createProgramme } from "./create-programme";
export { getExercise, getExerciseLibrary } from "./get-exercise-library";
export { getProgramme } from "./get-programme";
export { issueProgramme } from "./issue-programme";
export { listProgrammes } from "./list-programmes";
export { type RenderedHandout, renderHandout } from "./render-handout";
export { saveProgramme } from "./save-programme";
