export * from "./diary/appointment";
export * from "./diary/calendar-feed";
export * from "./diary/day";
export * from "./diary/finding";
export * from "./diary/live";
export * from "./diary/message";
export * from "./diary/settings";
export * from "./diary/today";
