export * from "./letters/content";
export * from "./letters/headings";
export * from "./letters/letter-input";
export * from "./letters/letter-view";
