/**
 * What is kept of a signed order beside its text, by the names it has in the database: copies that searches, plans and
 * rules on other orders read. `text` where there is nothing to compare them with.
 */
export const entriesBeside = [
  'text',
  'number',
  'order_id',
  'version_no',
  'agent',
  'product_id',
  'lot_id',
  'enclosure_id',
  'animals',
  'determination_id',
  'net_volume_litres',
  'allowed_drift_percent',
  'amount_entered_value',
  'amount_entered_unit',
  'target_mg_per_l',
  'starts_at',
  'doses',
  'interval_hours',
  'contact_minutes',
  'signed_at',
] as const
export type EntryBeside = (typeof entriesBeside)[number]

/** Those that say whose text it is: where one differs, the text may be that of another order or version. */
export const saysWhose: readonly EntryBeside[] = ['number', 'order_id', 'version_no']
