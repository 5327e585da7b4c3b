import type { Parts } from '../../platform/parts.ts'
import { readAudit } from './audit.reads.ts'
import { auditRoutes } from './audit.routes.ts'

export function createAudit(parts: Parts) {
  return { routes: auditRoutes((scope, filter) => readAudit(parts.dataSource, scope, filter)) }
}
