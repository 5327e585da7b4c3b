import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields, SaidBench } from '../../../shared/contracts/order-primitives.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { formatVolume } from '../../../shared/domain/quantities/format-volume.ts'
import { orderMissing, orderWords, volumeMethods } from '../../../shared/messages/orders.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import type { AnimalFacts } from '../animals/index.ts'
import type { WaterFacts } from '../water/index.ts'
import { isVessel } from './bath-facts.ts'
import { missingFields } from './order-situation.ts'
import type { OrderSituation } from './order-situation.ts'
import { saidAmount, saidCautions, saidCondition, saidLine } from './say-order.ts'

/** How many animals, in words. */
function countText({ count }: AnimalFacts): string {
  return count.basis === 'counted'
    ? orderWords.animalsCounted({ count: count.ledger })
    : orderWords.animalsEstimated({ low: count.low, high: count.high })
}

/** An animal or group in the water, in words. */
export const saidAnimal = (animal: AnimalFacts, treated: boolean) => ({
  animalId: animal.animalId,
  accession: animal.accession,
  commonName: animal.commonName,
  scientificName: animal.scientificName,
  countText: countText(animal),
  enclosureCode: animal.enclosureCode ?? '',
  treated,
})

/** The connected water and everybody in it, in words. */
export function saidWater(water: WaterFacts, animals: readonly AnimalFacts[], treated: readonly string[]) {
  const { volume, volumeRefusal } = water
  const usable = volume !== null && volumeRefusal === null
  return {
    enclosureCode: water.enclosureCode,
    vessel: isVessel(water),
    bodies: water.bodies.map((body) => body.code),
    volumeText: !usable
      ? null
      : volume.errorPercent === null
        ? formatVolume(volume.netVolumeLitres).text
        : formatVolumeWithError(volume.netVolumeLitres, volume.errorPercent).text,
    volumeNote: usable
      ? orderWords.volumeByMethod({
          method: volumeMethods[volume.method],
          date: sayDate(volume.measuredOn),
          by: '',
        })
      : orderWords.noVolume,
    animals: animals.map((animal) => saidAnimal(animal, treated.includes(animal.animalId))),
  }
}

/** Why there is no amount, and what to do about it. */
function saidRefusal(found: OrderSituation): OrderPreview['refusal'] {
  if (found.changed.length > 0)
    return { code: 'not-as-entered', field: null, detail: found.changed.join(' ') }
  const refusal = found.judgement?.refusal
  if (!refusal) return null
  const { code, field = null } = refusal
  const known = isNumberRefusalCode(code)
  return { code, field, detail: known ? sayNumberRefusal({ ...refusal, code }) : orderWords.noVolume }
}

/** An order as it stands while it is being written. */
export function presentPreview(
  fields: BathOrderFields,
  found: OrderSituation,
  bench: SaidBench | null,
): OrderPreview {
  const { situation, judgement } = found
  const zone = situation.base.zone
  return {
    amount: judgement?.dose ? saidAmount(judgement.dose) : null,
    refusal: saidRefusal(found),
    working: judgement?.dose?.working.map(saidLine) ?? [],
    water: saidWater(situation.water, situation.animals, fields.animalIds),
    cautions: saidCautions(found),
    conditions: judgement?.answer.conditions.map((condition) => saidCondition(condition, zone)) ?? [],
    missing: missingFields(fields).map((field) => orderMissing[field]),
    bench,
  }
}
