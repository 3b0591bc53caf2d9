export * from "./clinical/episodes";
export * from "./clinical/measures";
export * from "./clinical/notes";
