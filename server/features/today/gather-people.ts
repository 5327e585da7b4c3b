import type { Setting } from '../../../shared/contracts/facility.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import type { People } from '../people/index.ts'
import { waiting } from './work.ts'
import type { Moment } from './work.ts'

type Accounts = Awaited<ReturnType<People['questions']['accounts']>>

type Notice = Accounts[number]['notices'][number]
type Locks = Awaited<ReturnType<People['questions']['signingLocks']>>

/** A lock of signing is shown to the administrator for so long; the audit trail keeps it for ever. */
export const locksShownHours = 24

const toldOf = ({ licence, level, daysLeft, lastDay }: Notice): TodayWork['params'] => ({
  class: licence.class,
  number: licence.number,
  jurisdiction: licence.jurisdiction,
  level,
  days: daysLeft,
  until: lastDay,
})

/**
 * What the administrator has to see to: licences, locks of signing, accounts nobody has signed in to, settings nobody
 * confirmed.
 */
export function gatherPeople(
  accounts: Accounts,
  settings: readonly Setting[],
  locks: Locks,
  moment: Moment,
): TodayWork[] {
  const defaults = settings.filter(({ state, proposal }) => state === 'default' && proposal === null)
  return [
    ...accounts
      .filter(({ roles }) => roles.includes('veterinarian'))
      .filter(({ licenceUntil }) => licenceUntil === null)
      .map(({ personId, printedName }) =>
        waiting({
          id: `account-without-licence:${personId}`,
          kind: 'account-without-licence',
          params: { personId, name: printedName },
        }),
      ),
    ...accounts.flatMap(({ personId, printedName, licenceUntil, roles, notices }) =>
      notices
        // of a veterinarian without any it was said that there is none
        .filter(
          ({ licence }) =>
            licence.class !== 'veterinary' || licenceUntil !== null || !roles.includes('veterinarian'),
        )
        .map((notice) =>
          waiting({
            id: `licence-ends:${notice.licence.id}`,
            kind: 'licence-ends',
            params: { personId, name: printedName, ...toldOf(notice) },
          }),
        ),
    ),
    ...locks.map((lock) =>
      waiting({
        id: `signing-locked:${lock.id}`,
        kind: 'signing-locked',
        at: lock.locked_at.toISOString(),
        params: {
          personId: lock.person_id,
          name: lock.printed_name,
          count: lock.wrong_tries,
          since: lock.locked_at.toISOString(),
          until: lock.until_at.toISOString(),
          ...(lock.until_at > moment.now ? { running: 1 } : {}),
        },
      }),
    ),
    ...accounts
      .filter(({ lastSignInAt }) => lastSignInAt === null)
      .map(({ personId, printedName, createdAt }) =>
        waiting({
          id: `account-without-sign-in:${personId}`,
          kind: 'account-without-sign-in',
          at: createdAt,
          params: { personId, name: printedName },
        }),
      ),
    ...settings
      .filter(({ proposal }) => proposal !== null)
      .map(({ key, proposal }) =>
        waiting({
          id: `setting-proposed:${key}`,
          kind: 'setting-proposed',
          at: proposal?.proposedAt ?? null,
          params: { key, by: proposal?.proposedBy ?? '' },
        }),
      ),
    ...(defaults.length === 0
      ? []
      : [waiting({ id: 'settings-default', kind: 'settings-default', params: { count: defaults.length } })]),
  ]
}

/** A veterinarian whose own licence or registration has ended, or ends soon, is told before the first signature is refused. */
export async function gatherOwnLicence(people: People, moment: Moment): Promise<TodayWork[]> {
  const { personId } = moment.actor
  if (personId === null) return []
  const [licence, notices] = await Promise.all([
    people.questions.validLicence(personId, moment.now),
    people.questions.licenceNotices(personId, moment.now),
  ])
  const none = waiting({ id: `own-licence:${personId}`, kind: 'own-licence', params: {} })
  return [
    ...(licence ? [] : [none]),
    ...notices
      .filter((notice) => licence !== null || notice.licence.class !== 'veterinary')
      .map((notice) =>
        waiting({ id: `own-licence:${notice.licence.id}`, kind: 'own-licence', params: toldOf(notice) }),
      ),
  ]
}
