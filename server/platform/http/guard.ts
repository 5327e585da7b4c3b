import type { Contract } from '../../../shared/contracts/contract.ts'
import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { differentPersonWords } from '../../../shared/messages/different-person.ts'
import { permissionWords } from '../../../shared/messages/permissions.ts'
import { Problem } from './problem.ts'
import type { Actor } from './request-context.ts'

/** Somebody signed in, as every request loads them anew. */
export interface SignedIn extends Actor {
  personId: string
  mustChangePassword: boolean
}

/** Requests that change nothing need not say for whom they are. */
const reading = new Set(['get'])

/**
 * Refuses what was written by one person and arrives in the session of another: two windows of one browser share a
 * session. Absent passes, so that plain HTTP clients work.
 *
 * @param writtenBy the id that the client sent with its request, see `personHeader`
 */
export function checkWriter(of: Contract, person: SignedIn | null, writtenBy: string | undefined): void {
  if (reading.has(of.method) || !person || writtenBy === undefined || writtenBy === person.personId) return
  throw new Problem('different-person', {
    detail: differentPersonWords.detail({ name: person.printedName }),
    extra: { signed_in: person.printedName },
  })
}

/** What a person with a one-time password may still do. */
const beforePasswordChange = new Set(['getMe', 'changePassword', 'signOut'])

/**
 * Whether a caller may use an address, before anything of the request is read. Rights that depend on facts pass here
 * and are judged by the service.
 */
export function checkGate(of: Contract, person: SignedIn | null): void {
  if (of.action === 'public') return
  if (!person) throw new Problem('not-signed-in')
  if (person.mustChangePassword && !beforePasswordChange.has(of.id))
    throw new Problem('password-change-required', { detail: 'Change the one-time password, then go on.' })
  if (of.action === 'signed-in') return
  if (!decide(of.action, person.roles).allowed)
    throw new Problem('may-not', { detail: permissionWords.whoMay({ roles: rolesThatMay(of.action) }) })
}
