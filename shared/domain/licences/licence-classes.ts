import type { FacilityDate } from '../time/instant.ts'

/**
 * - `veterinary`            a licence to practise: with it orders, clearances, confirmations and overrides are signed
 * - `controlled-substance`  a registration to prescribe scheduled drugs; it signs nothing by itself
 */
export const licenceClasses = ['veterinary', 'controlled-substance'] as const
export type LicenceClass = (typeof licenceClasses)[number]

/** A licence as the record has it. */
export interface HeldLicence {
  id: string
  class: LicenceClass
  /** For which authority's area it is valid, as the facility's list has it. */
  jurisdiction: string
  number: string
  /** First and last day of validity as printed, both included. */
  validFrom: FacilityDate
  validUntil: FacilityDate
  /** Last day on which it was valid, where it was ended before its time. */
  endedOn: FacilityDate | null
  void: boolean
  /** Another entry stands in its place. */
  superseded: boolean
}

/** The last day on which a licence is valid: as printed, or earlier where it was ended. */
export const lastDayOf = ({
  validUntil,
  endedOn,
}: Pick<HeldLicence, 'validUntil' | 'endedOn'>): FacilityDate =>
  endedOn !== null && endedOn < validUntil ? endedOn : validUntil

const plain = (jurisdiction: string) => jurisdiction.trim().toLowerCase()

/** Whether two jurisdictions are the same, without regard to case and space around. */
export const isSameJurisdiction = (a: string, b: string): boolean => plain(a) === plain(b)

/** Whether the facility accepts licences of a jurisdiction. */
export const isAcceptedHere = (jurisdiction: string, accepted: readonly string[]): boolean =>
  accepted.some((one) => isSameJurisdiction(one, jurisdiction))
