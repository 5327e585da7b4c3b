import { decide } from './decide.ts'
import type { Role } from './roles.ts'

/** Whether somebody reads clinical words at all; whoever does not still sees every animal, every case and its clock. */
export const readsClinical = (roles: readonly Role[]): boolean => decide('chart.read', roles).allowed
