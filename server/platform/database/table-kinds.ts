/**
 * What kind each table is; a test compares this list with the rights that the runtime role really has.
 *
 * - draft       mutable, saved by version
 * - sealed      signed; only superseded by a new version row
 * - ledger      append-only; a correction is a new entry
 * - projection  derived; rebuilt in the transaction that changes its source
 * - plumbing    sessions, counters and the like, which hold no facts
 */
export type TableKind = 'draft' | 'sealed' | 'ledger' | 'projection' | 'plumbing'

export const tableKinds: Record<string, TableKind> = {
  migrations: 'ledger',
  session: 'plumbing',
  rate_limits: 'plumbing',
  command_keys: 'plumbing',
  counters: 'plumbing',
  audit_entries: 'ledger',
  people: 'draft',
  person_roles: 'draft',
  licences: 'ledger',
  licence_voids: 'ledger',
  sign_in_tries: 'ledger',
  setting_versions: 'ledger',
  setting_confirmations: 'ledger',
  enclosures: 'draft',
  water_bodies: 'draft',
  connections: 'draft',
  connection_states: 'ledger',
  life_support_units: 'draft',
  life_support_states: 'ledger',
  readings: 'ledger',
  water_ranges: 'ledger',
  water_events: 'ledger',
  isolations: 'ledger',
  isolation_bodies: 'ledger',
  isolation_tests: 'ledger',
  isolation_ends: 'ledger',
  volume_determinations: 'sealed',
  volume_determination_bodies: 'sealed',
  volume_determination_valves: 'sealed',
  volume_confirmations: 'ledger',
  water_voids: 'ledger',
  signed_texts: 'sealed',
  products: 'draft',
  product_lots: 'ledger',
  lot_events: 'ledger',
  dose_lines: 'ledger',
  dose_line_confirmations: 'ledger',
  taxa: 'draft',
  taxon_weight_bands: 'ledger',
  taxon_sensitivities: 'ledger',
  animals: 'draft',
  animal_descriptions: 'ledger',
  identifiers: 'ledger',
  identifier_ends: 'ledger',
  count_entries: 'ledger',
  count_statements: 'ledger',
  moves: 'ledger',
  stays: 'projection',
  weights: 'ledger',
  deaths: 'ledger',
  animal_voids: 'ledger',
  discrepancies: 'ledger',
  discrepancy_resolutions: 'ledger',
  movement_locks: 'ledger',
  movement_lock_lifts: 'ledger',
}
