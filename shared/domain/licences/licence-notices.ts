import { addDays } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'
import { isAcceptedHere, isSameJurisdiction, lastDayOf } from './licence-classes.ts'
import type { HeldLicence } from './licence-classes.ts'
import { licenceWarning, licenceWarningLevels } from './licence-warning.ts'
import type { LicenceWarningLevel, WarningDays } from './licence-warning.ts'

/** A licence that ends soon, or has ended with none in its place. */
export interface LicenceNotice<L extends HeldLicence = HeldLicence> {
  licence: L
  level: Exclude<LicenceWarningLevel, 'none'>
  /** Whole days of the facility to the last day; negative after it. */
  daysLeft: number
  lastDay: FacilityDate
}

/**
 * What is to be said of the licences of a person, the most pressing first.
 *
 * A licence that another one of the same class and jurisdiction follows without a day between them is not said to end.
 * One that has ended is said to have, as long as the person holds no other one of its class that is valid here; one that
 * was ended on purpose before its time is not.
 *
 * @param on       facility date of today
 * @param accepted jurisdictions the facility accepts; nothing is said of others
 * @param days     facility settings of the warnings
 */
export function licenceNotices<L extends HeldLicence>(
  licences: readonly L[],
  on: FacilityDate,
  accepted: readonly string[],
  days: WarningDays,
): LicenceNotice<L>[] {
  const standing = licences.filter(
    (one) => !one.void && !one.superseded && isAcceptedHere(one.jurisdiction, accepted),
  )
  const groups = standing.filter((one, i) => standing.findIndex((other) => isOfOneKind(one, other)) === i)
  const isValid = (one: L) => one.validFrom <= on && on <= lastDayOf(one)
  const notices = groups.flatMap((head): LicenceNotice<L>[] => {
    const group = standing.filter((one) => isOfOneKind(one, head))
    const current = group.filter(isValid)
    if (current.length > 0) {
      const last = lastOfRun(group, latest(current))
      const lastDay = lastDayOf(last)
      const { level, daysLeft } = licenceWarning(lastDay, on, days)
      return level === 'none' ? [] : [{ licence: last, level, daysLeft, lastDay }]
    }
    const over = group.filter((one) => lastDayOf(one) < on)
    const holdsAnother = standing.some((one) => one.class === head.class && isValid(one))
    if (over.length === 0 || holdsAnother) return []
    const last = latest(over)
    if (last.endedOn !== null) return []
    const lastDay = lastDayOf(last)
    const { daysLeft } = licenceWarning(lastDay, on, days)
    return [{ licence: last, level: 'ended', daysLeft, lastDay }]
  })
  const rank = ({ level }: LicenceNotice) => licenceWarningLevels.indexOf(level)
  return notices.sort((a, b) => rank(b) - rank(a) || a.daysLeft - b.daysLeft)
}

const isOfOneKind = (a: HeldLicence, b: HeldLicence) =>
  a.class === b.class && isSameJurisdiction(a.jurisdiction, b.jurisdiction)

const latest = <L extends HeldLicence>([first, ...rest]: readonly L[]): L =>
  rest.reduce((best, one) => (lastDayOf(one) > lastDayOf(best) ? one : best), first as L)

/** The last of the licences that follow `from` without a day on which none is valid. */
function lastOfRun<L extends HeldLicence>(group: readonly L[], from: L): L {
  const following = group.filter(
    (one) => one.validFrom <= addDays(lastDayOf(from), 1) && lastDayOf(one) > lastDayOf(from),
  )
  return following.length === 0 ? from : lastOfRun(group, latest(following))
}
