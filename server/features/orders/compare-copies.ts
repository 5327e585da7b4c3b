import { entriesBeside } from '../../../shared/domain/orders/entries-beside.ts'
import type { EntryBeside } from '../../../shared/domain/orders/entries-beside.ts'
import { targetMgPerL } from './target-mg-per-l.ts'
import type { SignedOrder } from './order-content.ts'

/** What the database keeps of a signed version beside its text, for searching and joining; as the database says it. */
export interface StoredCopies {
  version: Record<string, unknown>
  animalIds: readonly string[]
  order: { id: string; number: string }
}

/** The canonical text, read. */
export interface ReadText {
  content?: SignedOrder
  signedBy?: { printedName?: string; signedAt?: string; zone?: string }
  subject?: { kind?: string; id?: string; label?: string }
}

type Copy = string | number | null | undefined

/**
 * The columns that do not say what was signed. They are copies: one changed in the database, or a version pointed at the
 * text of another order, is as broken as a changed text, because searches, plans and rules on other orders read it.
 *
 * @returns names of what differs; `text` alone where nothing can be compared; none of an intact record
 */
export function differingCopies(
  { version, animalIds, order }: StoredCopies,
  text: ReadText | null,
): EntryBeside[] {
  const { content, subject, signedBy } = text ?? {}
  if (!content || !subject || !signedBy) return ['text']
  const { fields, product, volume, amount } = content
  const signed: Partial<Record<EntryBeside, Copy>> = {
    version_no: content.versionNo,
    agent: product.agent,
    product_id: product.id,
    lot_id: fields.lotId,
    enclosure_id: fields.enclosureId,
    determination_id: volume.determinationId,
    net_volume_litres: volume.netVolumeLitres,
    allowed_drift_percent: fields.allowedVolumeDriftPercent,
    amount_entered_value: Number(amount.measured?.value ?? Number.NaN),
    amount_entered_unit: amount.measured?.unit,
    target_mg_per_l: targetMgPerL(fields),
    doses: fields.doses,
    interval_hours: fields.intervalHours,
    contact_minutes: fields.timing === 'timed' ? fields.contactMinutes : null,
  }
  const differ = entriesBeside.filter((name) => name in signed && version[name] !== signed[name])
  const atOf = (name: string) => Date.parse(String(version[name]))
  if (atOf('starts_at') !== Date.parse(fields.startsAt ?? '')) differ.push('starts_at')
  if (atOf('signed_at') !== Date.parse(signedBy.signedAt ?? '')) differ.push('signed_at')
  if (subject.id !== order.id || subject.kind !== 'order') differ.push('order_id')
  if (subject.label !== order.number || content.number !== order.number) differ.push('number')
  const ids = (list: readonly string[]) => [...new Set(list)].sort().join()
  if (ids(animalIds) !== ids(fields.animalIds)) differ.push('animals')
  return differ
}
