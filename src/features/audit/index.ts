export { AuditTrail } from './audit-trail.tsx'
