export { listAudit } from "./list-audit";
export { type AuditEntry, recordAudit } from "./record-audit";
