import { listAudit } from '../../../shared/contracts/audit.contract.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { orderDraftedBy, orderNamedBy, presentAuditEntry } from './audit.present.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { AuditFilter, AuditRow, AuditScope } from './audit.reads.ts'

/** The part of the trail that roles open: all of it, clinical and one's own, or one's own. */
export function auditScopeOf(personId: string, held: readonly Role[]): AuditScope {
  const sees = (condition: 'clinical-and-own' | 'clinical-text-withheld') =>
    decide('audit.read', held, { [condition]: true }).allowed
  return {
    ownOf: sees('clinical-text-withheld') ? null : personId,
    clinical: sees('clinical-and-own'),
  }
}

export interface AuditQuestions {
  read(scope: AuditScope, filter: AuditFilter): Promise<{ rows: AuditRow[]; total: number }>
  /** Of some orders, by number, those with a dose to come that somebody may calculate blind. */
  blindAmong(numbers: readonly string[], actor: Actor): Promise<Set<string>>
  /** Of some orders, by number, those that keep a working of the bench which somebody is not to see. */
  benchLeftOutAmong(numbers: readonly string[], actor: Actor): Promise<Set<string>>
}

/** Whether an entry may hold what was asked on the bench; the text is searched, as few do. */
const keepsBench = (row: AuditRow): boolean => orderDraftedBy(row) !== null && row.text.includes('"bench":{')

export function auditRoutes({ read, blindAmong, benchLeftOutAmong }: AuditQuestions): Route[] {
  return [
    route(listAudit, async ({ query, context }) => {
      const { personId, roles } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      const limit = query.limit ?? 50
      const { q, subjectKind, subjectId } = query
      const before = query.cursor === undefined ? null : Number(query.cursor)
      const { rows, total } = await read(auditScopeOf(personId, roles), {
        q,
        subjectKind,
        subjectId,
        before,
        limit,
      })
      const mayReadClinical = decide('chart.read', roles, {}).allowed
      const orders = rows.flatMap((row) => orderNamedBy(row) ?? [])
      const blind = await blindAmong([...new Set(orders)], context.actor)
      const drafted = rows.flatMap((row) => (keepsBench(row) ? (orderDraftedBy(row) ?? []) : []))
      const benchLeftOut = await benchLeftOutAmong([...new Set(drafted)], context.actor)
      const last = rows.at(-1)
      return {
        rows: rows.map((row) => {
          const isOwn = row.actor_id === personId
          return presentAuditEntry(row, {
            clinical: !mayReadClinical && !isOwn,
            amount: !isOwn && blind.has(orderNamedBy(row) ?? ''),
            bench: !isOwn && keepsBench(row) && benchLeftOut.has(orderDraftedBy(row) ?? ''),
          })
        }),
        total,
        nextCursor: last && rows.length === limit && Number(last.seq) > 1 ? last.seq : null,
      }
    }),
  ]
}
