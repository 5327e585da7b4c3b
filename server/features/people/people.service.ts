import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Ids } from '../../platform/ids.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { personSubject as subject } from './person-subject.ts'
import type { OwnPassword } from '../../platform/sign-in/own-password.ts'
import { hashPassword, makeOneTimePassword } from '../../platform/sign-in/passwords.ts'
import { createLicencesService } from './licences.service.ts'
import * as repository from './people.repository.ts'

export interface PeopleParts {
  transactions: Transactions
  ids: Ids
  ownPassword: OwnPassword
}

export function createPeopleService(parts: PeopleParts) {
  const licences = createLicencesService(parts)

  async function setRoles(tx: Tx, personId: string, wanted: readonly Role[]): Promise<Role[]> {
    const held = await repository.rolesHeld(tx, personId)
    for (const role of held.filter((role) => !wanted.includes(role)))
      await repository.withdrawRole(tx, personId, role)
    for (const role of wanted.filter((role) => !held.includes(role)))
      await repository.grantRole(tx, {
        id: parts.ids.next(),
        personId,
        role,
        grantedAt: tx.at,
        grantedBy: tx.actor.personId,
        withdrawnAt: null,
        withdrawnBy: null,
      })
    return held
  }

  return {
    ...licences,

    /**
     * Enters a person with a one-time password, or with a given one for the first administrator and the demo.
     * @returns the one-time password, shown once; null when the same person was entered before
     */
    async enterPerson(
      context: RequestContext,
      given: { id: string; email: string; printedName: string; roles: Role[]; password?: string },
    ): Promise<{ oneTimePassword: string | null }> {
      const password = given.password ?? makeOneTimePassword()
      const passwordHash = await hashPassword(password)
      const created = await parts.transactions.inTransaction(context, async (tx) => {
        const row = {
          id: given.id,
          email: given.email,
          printedName: given.printedName,
          passwordHash,
          mustChangePassword: given.password === undefined,
          active: true,
          preferences: {},
          lastSignInAt: null,
          createdAt: tx.at,
          version: 1,
        }
        const inserted = await repository.insertPerson(tx, row)
        if (!inserted.created) return false
        await setRoles(tx, given.id, given.roles)
        tx.audit({
          action: 'person.enter',
          subject: subject(row),
          after: { email: row.email, printedName: row.printedName, roles: [...given.roles].sort() },
        })
        return true
      })
      return { oneTimePassword: created && given.password === undefined ? password : null }
    },

    /** Corrects name or e-mail, sets roles, closes or reopens the account. The last administrator stays one. */
    async correctPerson(
      context: RequestContext,
      id: string,
      given: { expectedVersion: number; email: string; printedName: string; roles: Role[]; active: boolean },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const before = await repository.lockPerson(tx, id)
        if (!before) throw new Problem('not-found')
        const staysAdministrator = given.active && given.roles.includes('administrator')
        const held = await repository.rolesHeld(tx, id)
        if (before.active && held.includes('administrator') && !staysAdministrator) {
          if ((await repository.countOtherAdministrators(tx, id)) === 0)
            throw new Problem('last-administrator', { detail: 'Make somebody else administrator first.' })
        }
        await repository.savePerson(
          tx,
          { id, version: given.expectedVersion },
          { email: given.email, printedName: given.printedName, active: given.active },
        )
        await setRoles(tx, id, given.roles)
        if (!given.active) await repository.endSessions(tx, id)
        tx.audit({
          action: 'person.correct',
          subject: subject(given.printedName ? { id, printedName: given.printedName } : before),
          before: {
            email: before.email,
            printedName: before.printedName,
            active: before.active,
            roles: held,
          },
          after: {
            email: given.email,
            printedName: given.printedName,
            active: given.active,
            roles: [...given.roles].sort(),
          },
        })
      })
    },

    /** Replaces the password and ends all sessions of the person. */
    async issueOneTimePassword(
      context: RequestContext,
      id: string,
    ): Promise<{ oneTimePassword: string | null }> {
      const password = makeOneTimePassword()
      const passwordHash = await hashPassword(password)
      let issued = false
      await parts.transactions.inTransaction(context, async (tx) => {
        const person = await repository.lockPerson(tx, id)
        if (!person) throw new Problem('not-found')
        await repository.setPassword(tx, id, passwordHash, true)
        await repository.endSessions(tx, id)
        tx.audit({ action: 'person.issue-one-time-password', subject: subject(person) })
        issued = true
      })
      return { oneTimePassword: issued ? password : null }
    },

    /** Changes the password and ends the person's sessions but the one in which it was changed. */
    async changeOwnPassword(
      context: RequestContext,
      given: { currentPassword: string; newPassword: string; sessionKept: string },
    ): Promise<void> {
      const id = context.actor.personId
      if (id === null) throw new Problem('not-signed-in')
      await parts.ownPassword.confirm(context, given.currentPassword, {
        pointer: '/currentPassword',
        detail: 'Nothing was changed. Type the password that you used until now.',
      })
      if (given.newPassword === given.currentPassword)
        throw new Problem('password-too-weak', {
          errors: [
            { pointer: '/newPassword', detail: 'Choose a password that differs from the one until now.' },
          ],
        })
      const passwordHash = await hashPassword(given.newPassword)
      await parts.transactions.inTransaction(context, async (tx) => {
        await repository.setPassword(tx, id, passwordHash, false)
        await repository.endSessions(tx, id, given.sessionKept)
        tx.audit({
          action: 'person.change-password',
          subject: { kind: 'person', id, label: context.actor.printedName },
        })
      })
    },

    async setPreference(context: RequestContext, name: string, value: string): Promise<void> {
      const id = context.actor.personId
      if (id === null) throw new Problem('not-signed-in')
      await parts.transactions.inTransaction(context, async (tx) => {
        const person = await repository.lockPerson(tx, id)
        if (!person) throw new Problem('not-found')
        const before = person.preferences[name] ?? null
        await repository.setPreferences(tx, id, { ...person.preferences, [name]: value })
        tx.audit({
          action: 'person.set-preference',
          subject: subject(person),
          before: { [name]: before },
          after: { [name]: value },
        })
      })
    },

    async noteSignIn(context: RequestContext): Promise<void> {
      const { personId, printedName } = context.actor
      if (personId === null) return
      await parts.transactions.inTransaction(context, async (tx) => {
        await repository.noteSignIn(tx, personId)
        tx.audit({ action: 'person.sign-in', subject: { kind: 'person', id: personId, label: printedName } })
      })
    },
  }
}

export type PeopleService = ReturnType<typeof createPeopleService>
