export { listAudit } from "./list-audit";
export { type AuditEntry, auditWrite, recordAudit, recordAudits } from "./record-audit";
