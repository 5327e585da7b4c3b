import { decide, rolesThatMay } from '../../shared/domain/permissions/decide.ts'
import type { Action, Condition } from '../../shared/domain/permissions/table.ts'
import type { Me } from '../../shared/contracts/sign-in.contract.ts'
import { frameWords } from '../../shared/messages/frame.ts'
import { permissionWords } from '../../shared/messages/permissions.ts'
import { useMe } from './me.ts'

export interface May {
  allowed: boolean
  /** Why not, in words for the hint under a shut button; undefined when allowed. */
  why: string | undefined
  /** Conditions that only the server can judge; it asks again with the facts. */
  conditions: Condition[]
}

/**
 * Whether a person may do something, by the same table as the server's guard. A licence is judged here too, because
 * who is signed in says whether one is valid today; other conditions are left open.
 */
export function mayOf(me: Pick<Me, 'roles' | 'mayPractise'>, action: Action): May {
  const open = decide(action, me.roles)
  if (!open.allowed) {
    return { allowed: false, why: permissionWords.whoMay({ roles: rolesThatMay(action) }), conditions: [] }
  }
  const onlyLicence = open.conditions.length === 1 && open.conditions[0] === 'valid-licence'
  if (onlyLicence && !me.mayPractise)
    return { allowed: false, why: frameWords.noValidLicence, conditions: [] }
  return { allowed: true, why: undefined, conditions: onlyLicence ? [] : open.conditions }
}

/** Whether the signed-in person may do something, and if not, why, for the button. */
export function useMay(action: Action): May {
  return mayOf(useMe(), action)
}
