export { auditActions, type AuditAction } from "./audit-actions";
export { getAuditPage } from "./get-audit-page";
export { listAudit, type AuditEntry } from "./list-audit";
export { verifyChain, type ChainVerdict } from "./verify-chain";
export { writeAudit } from "./write-audit";
