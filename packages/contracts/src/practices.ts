export * from "./practices/accounts";
export * from "./practices/api-keys";
export * from "./practices/settings";
export * from "./practices/sites";
export * from "./practices/staff";
