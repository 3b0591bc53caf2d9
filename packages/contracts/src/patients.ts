export * from "./patients/address-book";
export * from "./patients/patient-input";
export * from "./patients/patient-list";
export * from "./patients/patient-view";
export * from "./patients/timeline";
