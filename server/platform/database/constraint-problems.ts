import type { ProblemCode } from '../../../shared/contracts/problems.ts'
import { Problem } from '../http/problem.ts'

/** Which refusal a race runs into when the database stops what the service had just found allowed. */
const byConstraint: Record<string, ProblemCode> = {
  uq_product_lots_number: 'number-already-used',
  uq_dose_line_confirmations_line: 'already-confirmed',
  uq_dose_lines_supersedes: 'stale-version',
  uq_rule_parameter_versions_supersedes: 'stale-version',
  uq_rule_parameter_versions_first: 'stale-version',
  uq_rule_parameter_confirmations_version: 'already-confirmed',
  uq_people_email: 'email-already-used',
  ck_licences_period: 'period-reversed',
  uq_licences_supersedes: 'licence-changed',
  uq_licence_ends_licence: 'licence-changed',
  uq_licence_voids_licence: 'licence-changed',
  uq_setting_confirmations_version: 'already-confirmed',
  uq_enclosures_code: 'number-already-used',
  uq_water_bodies_code: 'number-already-used',
  uq_connections_code: 'number-already-used',
  uq_life_support_units_code: 'number-already-used',
  ck_water_bodies_in_use: 'period-reversed',
  ck_connections_in_use: 'period-reversed',
  ck_life_support_units_in_use: 'period-reversed',
  ck_connections_two_bodies: 'same-body-twice',
  uq_isolation_ends_isolation: 'isolation-ended',
  uq_volume_confirmations_determination: 'already-confirmed',
  ck_volume_confirmations_another_person: 'another-person-needed',
  uq_water_voids_reading: 'already-void',
  uq_water_voids_event: 'already-void',
  uq_water_voids_connection_state: 'already-void',
  uq_water_voids_life_support_state: 'already-void',
  uq_water_voids_determination: 'already-void',
  uq_water_voids_isolation: 'already-void',
  uq_taxa_scientific_name: 'taxon-already-known',
  ck_count_entries_running_sum: 'count-too-small',
  ck_count_entries_individual: 'not-a-group',
  ex_stays_one_place: 'contradicts-another-move',
  uq_discrepancy_resolutions_discrepancy: 'already-resolved',
  uq_counterparties_name: 'name-already-used',
  ck_permits_period: 'period-reversed',
  uq_document_voids_document: 'already-voided',
  uq_permit_voids_permit: 'already-voided',
  uq_transaction_voids_transaction: 'already-voided',
  uq_permit_use_explanations_use: 'already-explained',
  uq_protocol_confirmations_version: 'already-confirmed',
  uq_case_events_cleared: 'case-ended',
  uq_case_events_void: 'already-void',
  uq_dose_voids_dose: 'already-void',
  uq_dose_voids_stop: 'already-void',
  uq_observation_bodies_observation: 'already-explained',
  uq_observation_voids_observation: 'already-void',
}

/** The problem for a broken constraint; null when none is foreseen, which is a bug and answers 500. */
export function problemFromConstraint(constraint: string): Problem | null {
  const code = byConstraint[constraint]
  return code ? new Problem(code) : null
}
