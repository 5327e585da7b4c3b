import type { Setting } from '../../../shared/contracts/facility.contract.ts'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { licenceRunsOut } from '../../../shared/domain/licences/licence-runs-out.ts'
import type { People } from '../people/index.ts'
import { waiting } from './work.ts'
import type { Moment } from './work.ts'

type Accounts = Awaited<ReturnType<People['questions']['accounts']>>

/** What the administrator has to see to: licences, accounts nobody has signed in to, settings nobody confirmed. */
export function gatherPeople(accounts: Accounts, settings: readonly Setting[], moment: Moment): TodayWork[] {
  const defaults = settings.filter(({ state, proposal }) => state === 'default' && proposal === null)
  return [
    ...accounts
      .filter(({ roles }) => roles.includes('veterinarian'))
      .filter(({ licenceUntil }) => licenceUntil === null || licenceRunsOut(licenceUntil, moment.on))
      .map(({ personId, printedName, licenceUntil }) =>
        waiting({
          id: `account-without-licence:${personId}`,
          kind: 'account-without-licence',
          params: { personId, name: printedName, ...(licenceUntil === null ? {} : { until: licenceUntil }) },
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

/** A veterinarian whose own licence has ended, or ends soon, is told before the first signature is refused. */
export async function gatherOwnLicence(people: People, moment: Moment): Promise<TodayWork[]> {
  const { personId } = moment.actor
  if (personId === null) return []
  const licence = await people.questions.validLicence(personId, moment.now)
  if (licence && !licenceRunsOut(licence.validUntil, moment.on)) return []
  return [
    waiting({
      id: `own-licence:${personId}`,
      kind: 'own-licence',
      params: licence ? { until: licence.validUntil } : {},
    }),
  ]
}
