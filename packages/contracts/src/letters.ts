export * from "./letters/content";
export * from "./letters/letter-input";
export * from "./letters/letter-view";
