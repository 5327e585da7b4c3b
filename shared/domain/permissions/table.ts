import type { Role } from './roles.ts'

/**
 * A right that depends on facts. The guard lets such a call through to the service, which knows the facts and asks again.
 *
 * - `valid-licence`        the person holds a licence valid on the day for a jurisdiction the facility accepts
 * - `another-person`       not the person whose work is confirmed, calculated again or witnessed
 * - `proposal-only`        may write a proposal, which a veterinarian or technician takes up
 * - `summary-only`         problems, orders and cautions, without notes and results
 * - `where-the-order-allows` feed-borne and topical doses that the order opens to keepers
 * - `named-in-standing-order` the standing order names this person
 * - `named-for-controlled-drugs` the facility named this technician
 * - `hygiene-only`         the hygiene log, not the discharge record
 * - `flag-only`            may flag something seen, not record a round
 * - `open-only`            may open a case, not split it or change its protocol
 * - `inside-quarantine-boundary` the move stays inside one quarantine boundary, or the animal is cleared
 * - `named-role`           the discrepancy is for a role that the person holds
 * - `own-record-of-the-day` the person recorded it, today by the days of the facility
 * - `no-documented-transfer` the move is no veterinarian’s transfer across a quarantine boundary, and broke no rule
 * - `may-write-parent`     may write the record that the document belongs to
 * - `clinical-and-own` · `own-entries` · `clinical-text-withheld`  the part of the audit trail that is shown
 */
export type Condition =
  | 'valid-licence'
  | 'another-person'
  | 'proposal-only'
  | 'summary-only'
  | 'where-the-order-allows'
  | 'named-in-standing-order'
  | 'named-for-controlled-drugs'
  | 'hygiene-only'
  | 'flag-only'
  | 'open-only'
  | 'inside-quarantine-boundary'
  | 'named-role'
  | 'own-record-of-the-day'
  | 'no-documented-transfer'
  | 'may-write-parent'
  | 'clinical-and-own'
  | 'own-entries'
  | 'clinical-text-withheld'

export type Cell = 'yes' | 'no' | Condition
type Row = Record<Role, Cell>

const row = (
  veterinarian: Cell,
  technician: Cell,
  keeper: Cell,
  registrar: Cell,
  administrator: Cell,
): Row => ({ veterinarian, technician, keeper, registrar, administrator })

/**
 * Who may do what: one row an action, one column a role. The server's guard and the client's buttons both read it.
 * Reading rights that differ from writing rights have an action of their own.
 */
export const permissions = {
  'collection.read': row('yes', 'yes', 'yes', 'yes', 'yes'),
  'order.read': row('yes', 'yes', 'yes', 'yes', 'no'),
  'order.print': row('yes', 'yes', 'yes', 'no', 'no'),
  'chart.read': row('yes', 'yes', 'summary-only', 'summary-only', 'no'),
  'chart.write': row('yes', 'no', 'no', 'no', 'no'),
  'weight.record': row('yes', 'yes', 'yes', 'no', 'no'),
  'weight.strike': row('yes', 'own-record-of-the-day', 'own-record-of-the-day', 'no', 'no'),
  'sample.take': row('yes', 'yes', 'yes', 'no', 'no'),
  'result.enter': row('yes', 'yes', 'no', 'no', 'no'),
  'water.record': row('yes', 'yes', 'yes', 'no', 'no'),
  'water.configure': row('yes', 'yes', 'proposal-only', 'no', 'no'),
  'volume.confirm': row('another-person', 'another-person', 'no', 'no', 'no'),
  'order.draft': row('yes', 'proposal-only', 'no', 'no', 'no'),
  'order.take-by-telephone': row('yes', 'yes', 'no', 'no', 'no'),
  'order.cite-standing': row('yes', 'yes', 'named-in-standing-order', 'no', 'no'),
  'order.sign': row('valid-licence', 'no', 'no', 'no', 'no'),
  'order.amend': row('valid-licence', 'no', 'no', 'no', 'no'),
  'order.discontinue': row('yes', 'no', 'no', 'no', 'no'),
  'caution.override': row('valid-licence', 'no', 'no', 'no', 'no'),
  'caution.review': row('yes', 'no', 'no', 'no', 'no'),
  'hold.lift': row('yes', 'no', 'no', 'no', 'no'),
  'bath.stop': row('yes', 'yes', 'yes', 'no', 'no'),
  'order.hold': row('yes', 'yes', 'yes', 'no', 'no'),
  'case.hold': row('yes', 'yes', 'yes', 'no', 'no'),
  'dose.give': row('yes', 'yes', 'where-the-order-allows', 'no', 'no'),
  'dose.record': row('yes', 'yes', 'yes', 'no', 'no'),
  'dose.strike': row('yes', 'own-record-of-the-day', 'own-record-of-the-day', 'no', 'no'),
  'dose.calculate-second': row('another-person', 'another-person', 'another-person', 'no', 'no'),
  'adverse-event.record': row('yes', 'yes', 'yes', 'no', 'no'),
  'adverse-event.review': row('yes', 'no', 'no', 'no', 'no'),
  'stock.manage': row('yes', 'yes', 'no', 'no', 'no'),
  'lot.return': row('yes', 'another-person', 'no', 'no', 'no'),
  'stock.controlled': row('yes', 'named-for-controlled-drugs', 'no', 'no', 'no'),
  'discharge.record': row('yes', 'yes', 'hygiene-only', 'no', 'no'),
  'observation.record': row('yes', 'yes', 'yes', 'no', 'no'),
  'death.strike': row('yes', 'own-record-of-the-day', 'own-record-of-the-day', 'no', 'no'),
  'notice.see': row('another-person', 'another-person', 'no', 'no', 'no'),
  'observation.flag': row('yes', 'yes', 'yes', 'yes', 'no'),
  'case.open': row('yes', 'yes', 'no', 'no', 'no'),
  'case.configure': row('yes', 'no', 'no', 'no', 'no'),
  'clock.report': row('yes', 'yes', 'yes', 'no', 'no'),
  'case.clear': row('valid-licence', 'no', 'no', 'no', 'no'),
  'case.lock': row('yes', 'no', 'no', 'no', 'no'),
  'necropsy.write': row('yes', 'yes', 'no', 'no', 'no'),
  'necropsy.sign': row('valid-licence', 'no', 'no', 'no', 'no'),
  'register.read': row('yes', 'yes', 'yes', 'yes', 'no'),
  'register.manage': row('no', 'no', 'no', 'yes', 'no'),
  'taxon.set-sensitivity': row('yes', 'no', 'no', 'no', 'no'),
  'animal.say-food-or-release': row('yes', 'no', 'no', 'yes', 'no'),
  'animal.move': row(
    'yes',
    'inside-quarantine-boundary',
    'inside-quarantine-boundary',
    'inside-quarantine-boundary',
    'no',
  ),
  'move.strike': row('yes', 'own-record-of-the-day', 'own-record-of-the-day', 'no-documented-transfer', 'no'),
  'discrepancy.resolve': row('named-role', 'no', 'no', 'named-role', 'no'),
  'history.export': row('yes', 'no', 'no', 'yes', 'no'),
  'formulary.propose': row('yes', 'yes', 'no', 'no', 'no'),
  'formulary.confirm': row('valid-licence', 'no', 'no', 'no', 'no'),
  'document.attach': row(
    'may-write-parent',
    'may-write-parent',
    'may-write-parent',
    'may-write-parent',
    'may-write-parent',
  ),
  'people.manage': row('no', 'no', 'no', 'no', 'yes'),
  'facility.read': row('yes', 'yes', 'yes', 'yes', 'yes'),
  'facility.manage': row('no', 'no', 'no', 'no', 'yes'),
  'profile.manage': row('yes', 'yes', 'yes', 'yes', 'yes'),
  'audit.read': row(
    'clinical-and-own',
    'own-entries',
    'own-entries',
    'own-entries',
    'clinical-text-withheld',
  ),
} as const satisfies Record<string, Row>

export type Action = keyof typeof permissions
export const actions = Object.keys(permissions) as Action[]
