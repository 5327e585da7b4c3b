import type { Role } from './roles.ts'
import { permissions } from './table.ts'
import type { Action, Cell, Condition } from './table.ts'

export interface Decision {
  allowed: boolean
  /** Why it was refused: no role of the person has the right, or the condition that is not met. */
  why: 'role' | Condition | null
  /** Conditions that still have to be judged with facts; empty once facts were given. */
  conditions: Condition[]
}

/**
 * Whether somebody may do something, by the permission table.
 *
 * Without facts a conditional right is allowed provisionally and names its conditions: so the guard at the door
 * and the button on the screen. With facts it is decided: a condition that is absent from them counts as not met.
 *
 * @param action one row of the table
 * @param held   the roles of the person; their rights are the union
 * @param facts  which conditions hold, judged by the service after it locked the rows
 */
export function decide(
  action: Action,
  held: readonly Role[],
  facts?: Partial<Record<Condition, boolean>>,
): Decision {
  const cells = held.map((role): Cell => permissions[action][role])
  if (cells.includes('yes')) return { allowed: true, why: null, conditions: [] }
  const conditions = [...new Set(cells.filter((cell): cell is Condition => cell !== 'no' && cell !== 'yes'))]
  const first = conditions[0]
  if (first === undefined) return { allowed: false, why: 'role', conditions: [] }
  if (!facts) return { allowed: true, why: null, conditions }
  const met = conditions.some((condition) => facts[condition] === true)
  return met ? { allowed: true, why: null, conditions: [] } : { allowed: false, why: first, conditions: [] }
}

/** The roles that have the right at all, with or without a condition: for the words "a veterinarian may". */
export function rolesThatMay(action: Action): Role[] {
  return (Object.entries(permissions[action]) as [Role, Cell][])
    .filter(([, cell]) => cell !== 'no')
    .map(([role]) => role)
}
