export { type AuditEntry, recordAudit } from "./record-audit";
