import type { Firing } from '../../../shared/domain/cautions/tally-firings.ts'
import { overrideOf } from '../../../shared/domain/orders/signed-answers.ts'
import type { SignedAnswer } from '../../../shared/domain/orders/signed-answers.ts'
import type { Db } from '../../platform/database/db.ts'

interface SignedContent {
  cautions?: { ruleId: string; code: string; text: string; level: string; overridable: boolean }[]
  overrides?: (SignedAnswer & { reason: string })[]
  ruleId?: string
  reason?: string
}

/** What a signed text says fired: the cautions of an order, or the one stop of an override at a dose. */
function firingsOf(kind: string, content: SignedContent): Firing[] {
  if (kind === 'dose-override')
    return content.ruleId === undefined ? [] : [{ ruleId: content.ruleId, reason: content.reason ?? '' }]
  return (content.cautions ?? []).map((caution) => ({
    ruleId: caution.ruleId,
    reason: overrideOf(content.overrides ?? [], caution)?.reason ?? null,
  }))
}

/**
 * Every time that a rule fired in a month and something was signed or recorded all the same. What fired and was resolved
 * before anybody signed leaves no record. Days are those of the facility, as they were signed.
 *
 * @param month for example 2026-12
 */
export async function readFirings(db: Db, month: string): Promise<{ firings: Firing[]; unreadable: number }> {
  // no zone is more than a day away: the exact day stands in the text
  const texts: { subject_kind: string; text: string }[] = await db.query(
    `SELECT subject_kind, text FROM signed_texts
      WHERE subject_kind IN ('order', 'dose-override')
        AND signed_at >= to_date($1, 'YYYY-MM') - interval '2 days'
        AND signed_at < to_date($1, 'YYYY-MM') + interval '1 month 2 days'
      ORDER BY signed_at, id`,
    [month],
  )
  const doses: { exceptions_text: string }[] = await db.query(
    `SELECT exceptions_text FROM live_doses WHERE to_char(happened_on, 'YYYY-MM') = $1 ORDER BY happened_at, id`,
    [month],
  )
  const firings: Firing[] = []
  let unreadable = 0
  for (const { subject_kind: kind, text } of texts) {
    try {
      const { content, signedBy } = JSON.parse(text) as {
        content: SignedContent
        signedBy: { signedOn: string }
      }
      if (signedBy.signedOn.startsWith(month)) firings.push(...firingsOf(kind, content))
    } catch {
      unreadable += 1
    }
  }
  for (const { exceptions_text: text } of doses)
    firings.push(
      ...(JSON.parse(text) as { ruleId: string }[]).map(({ ruleId }) => ({ ruleId, reason: null })),
    )
  return { firings, unreadable }
}
