import { Problem } from '../../platform/http/problem.ts'
import type { AnswerForPrint } from '../documents/index.ts'
import type { OrderQueries } from './orders.queries.ts'

/** What was printed and is there no more was taken away. */
function whereGone(error: unknown): null {
  if (error instanceof Problem && (error.code === 'broken-record' || error.code === 'not-found')) return null
  throw error
}

/**
 * Whether a printed order, or a bath sheet printed from it, may still be acted on: the gravest answer first. A version
 * that ran its course is still what was signed.
 */
export function answerForOrderPrints(queries: OrderQueries): AnswerForPrint {
  return async (print) => {
    const printed = await queries.sealed(print.subject_label, Number(print.version)).catch(whereGone)
    if (!printed) return { state: 'broken', now: null }
    const newest = printed.superseded
      ? (await queries.sealed(print.subject_label, undefined)).versionNo
      : printed.versionNo
    const now = printed.superseded ? String(newest) : null
    if (printed.block.state === 'broken' || printed.block.hash !== print.fingerprint)
      return { state: 'broken', now }
    if (printed.row.phase === 'discontinued') return { state: 'discontinued', now }
    if (printed.superseded) return { state: 'superseded', now }
    if (printed.row.phase === 'held') return { state: 'held', now }
    return { state: printed.block.state === 'intact' ? 'current' : 'unknown', now }
  }
}
