export * from "./practices/accounts";
export * from "./practices/settings";
export * from "./practices/sites";
export * from "./practices/staff";
