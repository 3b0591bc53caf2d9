export * from "./billing/draft-inputs";
export * from "./billing/invoice-kinds";
export * from "./billing/invoice-list";
export * from "./billing/invoice-view";
export * from "./billing/payment-inputs";
