import type { Parts } from '../../platform/parts.ts'
import { readAudit } from './audit.reads.ts'
import { auditRoutes } from './audit.routes.ts'
import type { AuditQuestions } from './audit.routes.ts'

export function createAudit({
  dataSource,
  blindAmong,
  benchLeftOutAmong,
}: Parts & Pick<AuditQuestions, 'blindAmong' | 'benchLeftOutAmong'>) {
  return {
    routes: auditRoutes({
      read: (scope, filter) => readAudit(dataSource, scope, filter),
      blindAmong,
      benchLeftOutAmong,
    }),
  }
}
