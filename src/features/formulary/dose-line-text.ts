import type { DoseLine } from '../../../shared/contracts/formulary.contract.ts'
import { routeOfUse } from '../../../shared/domain/formulary/dose-line.ts'
import { formatDoseRange } from '../../../shared/domain/quantities/format-dose-range.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { doseUses, waterKinds } from '../../../shared/messages/formulary.ts'
import { formularyWords as words } from '../../../shared/messages/formulary-screens.ts'

/** "1 to 2 mg/L", "up to 250 µL/L". */
export function rangeOfLine({ low, high, unit }: Pick<DoseLine, 'low' | 'high' | 'unit'>): string {
  if (!isUnitCode(unit)) return `${String(high)}\u00a0${unit}`
  if (low === null) return words.upTo({ amount: formatDose(high, unit).text })
  if (low === high) return formatDose(high, unit).text
  return formatDoseRange(low, high, unit, words.to).text
}

/** What a dose line is for, in words; a use that this version has no words for stands as its code. */
export function useOfLine({ use }: Pick<DoseLine, 'use'>): string {
  return Object.hasOwn(doseUses, use) ? doseUses[use as keyof typeof doseUses] : use
}

/** The water that a dose line is for; a dose by weight goes into none. */
export function waterOfLine({ use, water }: Pick<DoseLine, 'use' | 'water'>): string {
  return routeOfUse(use) === 'immersion' ? waterKinds[water] : words.intoNoWater
}
