export { listAudit } from "./list-audit";
export { type AuditEntry, recordAudit, recordAudits } from "./record-audit";
