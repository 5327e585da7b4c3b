import { refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { knownVolume } from './known-volume.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeSheet } from './volume-sheet.ts'

/**
 * Net volume from salt weighed in and the rise that it made: mass ÷ rise. The rise is in grams per litre; a rise in
 * g/kg or PSS-78 is another thing in another water, and is refused by its unit.
 *
 * @refuses as parseQuantity · salinity-did-not-rise (salinityRise) · as knownVolume
 * @source  salt mass balance
 */
export function volumeByDilution(
  sheet: Extract<VolumeSheet, { method: 'salt-dilution' }>,
): Result<VolumeDetermination, VolumeRefusal> {
  const mass = parseQuantity(sheet.saltMass, { dimension: 'mass', above: 0, field: 'saltMass' })
  if (!mass.ok) return mass
  const rise = parseQuantity(sheet.salinityRise, { dimension: 'massConcentration', field: 'salinityRise' })
  if (!rise.ok) return rise
  if (rise.value.value <= 0) return refuse('salinity-did-not-rise', 'salinityRise')
  const litres = (mass.value.value * 1000) / rise.value.value
  const expression = `${enteredTerm(mass.value)} / (${enteredTerm(rise.value)}) to L`
  const line = {
    key: 'net-volume',
    code: 'water-salt-dilution' as const,
    params: {},
    expression,
    value: litres,
  }
  return knownVolume('salt-dilution', [{ ...line, unit: 'L', rests: [] }], litres, sheet.errorPercent)
}
