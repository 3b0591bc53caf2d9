export * from "./diary/appointment";
export * from "./diary/day";
export * from "./diary/finding";
export * from "./diary/message";
export * from "./diary/today";
