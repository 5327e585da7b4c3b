import { decide } from '../permissions/decide.ts'
import type { Role } from '../permissions/roles.ts'
import type { Action, Condition } from '../permissions/table.ts'

/** The columns of the worklist. Urgent calls stand over all of them. */
export const todayLanes = ['urgent', 'decide', 'doses', 'watch', 'register', 'people'] as const
export type TodayLane = (typeof todayLanes)[number]

interface KindOfWork {
  lane: TodayLane
  /** Whoever may do this sees the item; the server asks again when it is done. */
  action: Action
  /** The one role that is named for it, where the action is for several. */
  forRole?: Role
}

/**
 * Every kind of work that can stand on Today: in which lane, and for whom.
 *
 * The order within the table is the order of items of the same instant.
 */
export const todayKinds = {
  'urgent-call': { lane: 'urgent', action: 'observation.flag' },
  'own-licence': { lane: 'decide', action: 'order.sign' },
  'observation-flagged': { lane: 'decide', action: 'chart.write' },
  'order-held': { lane: 'decide', action: 'hold.lift' },
  'case-held': { lane: 'decide', action: 'hold.lift' },
  'order-proposed': { lane: 'decide', action: 'order.sign' },
  'order-draft': { lane: 'decide', action: 'order.sign' },
  'case-ready': { lane: 'decide', action: 'case.clear' },
  'dose-exceptions': { lane: 'decide', action: 'chart.write' },
  'discrepancy-veterinarian': { lane: 'decide', action: 'discrepancy.resolve', forRole: 'veterinarian' },
  'bodies-veterinarian': { lane: 'decide', action: 'discrepancy.resolve', forRole: 'veterinarian' },
  'bath-running': { lane: 'doses', action: 'bath.stop' },
  'second-calculation': { lane: 'doses', action: 'dose.calculate-second' },
  dose: { lane: 'doses', action: 'dose.give' },
  'order-not-carried-out': { lane: 'doses', action: 'dose.record' },
  sample: { lane: 'doses', action: 'sample.take' },
  'volume-to-confirm': { lane: 'doses', action: 'volume.confirm' },
  'volume-check': { lane: 'doses', action: 'volume.confirm' },
  'outside-case': { lane: 'doses', action: 'case.open' },
  'case-to-close': { lane: 'doses', action: 'case.open' },
  observation: { lane: 'watch', action: 'observation.record' },
  care: { lane: 'watch', action: 'observation.record' },
  'discrepancy-registrar': { lane: 'register', action: 'discrepancy.resolve', forRole: 'registrar' },
  'bodies-registrar': { lane: 'register', action: 'discrepancy.resolve', forRole: 'registrar' },
  'movement-marked': { lane: 'register', action: 'register.manage' },
  'transaction-marks': { lane: 'register', action: 'register.manage' },
  'transaction-papers': { lane: 'register', action: 'register.manage' },
  'permit-marks': { lane: 'register', action: 'register.manage' },
  'permit-runs-out': { lane: 'register', action: 'register.manage' },
  'account-without-licence': { lane: 'people', action: 'people.manage' },
  'licence-ends': { lane: 'people', action: 'people.manage' },
  'signing-locked': { lane: 'people', action: 'people.manage' },
  'account-without-sign-in': { lane: 'people', action: 'people.manage' },
  'setting-proposed': { lane: 'people', action: 'facility.manage' },
  'settings-default': { lane: 'people', action: 'facility.manage' },
} as const satisfies Record<string, KindOfWork>

export type TodayKind = keyof typeof todayKinds
export const todayKindNames = Object.keys(todayKinds) as [TodayKind, ...TodayKind[]]

/** Conditions that are judged item by item, with its facts; here they keep nobody from seeing the kind. */
const judgedByItem: Partial<Record<Condition, boolean>> = {
  'valid-licence': true,
  'another-person': true,
  'named-role': true,
}

/** Whether work of a kind is for somebody with these roles. A veterinarian without a licence sees what waits for one. */
export function isForRoles(kind: TodayKind, roles: readonly Role[]): boolean {
  const { action, forRole }: KindOfWork = todayKinds[kind]
  if (forRole !== undefined && !roles.includes(forRole)) return false
  return decide(action, roles, judgedByItem).allowed
}

const ownLanes: Record<Role, TodayLane> = {
  veterinarian: 'decide',
  technician: 'doses',
  keeper: 'watch',
  registrar: 'register',
  administrator: 'people',
}

/** The lanes that are somebody's own by their roles; others they see because they may help there. */
export function lanesOf(roles: readonly Role[]): TodayLane[] {
  const own = roles.map((role) => ownLanes[role])
  return todayLanes.filter((lane) => lane === 'urgent' || own.includes(lane))
}
