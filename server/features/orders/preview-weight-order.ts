import type {
  WeightOrderFields,
  WeightOrderPreview,
} from '../../../shared/contracts/weight-orders.contract.ts'
import type { WeightDose } from '../../../shared/domain/dose/weight-dose.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { weightOrderMissing, weightOrderProblems } from '../../../shared/messages/weight-orders.ts'
import type { AnimalFacts } from '../animals/index.ts'
import { saidAnimal } from './preview-order.ts'
import { saidAmount, saidCaution, saidCondition, saidLine } from './say-order.ts'
import { missingByWeight } from './weight-situation.ts'
import type { WeightSituation } from './weight-situation.ts'

const said = (dose: WeightDose): WeightOrderPreview['amount'] => {
  const { unrounded, unroundedUnit, measured, text } = saidAmount(dose)
  return {
    unrounded,
    unroundedUnit,
    measured,
    text,
    roundingPercent: dose.roundingPercent ?? null,
    portions: dose.portions ?? [],
    thinTo: dose.thinTo ?? null,
  }
}

const significantDigits = 4

/** The weight that the amount goes by: of one animal as it was entered, of several the mean. */
function saidWeight({ newestWeight: weight }: AnimalFacts): WeightOrderPreview['weight'] {
  if (!weight) return null
  const { animalsWeighed, basis, happenedOn } = weight
  const mass =
    animalsWeighed === 1
      ? { value: weight.value, unit: weight.unit as UnitCode }
      : quantityOf(Number(weight.weightKg.toPrecision(significantDigits)), 'kg')
  return { text: formatReading(mass).text, basis, happenedOn, animalsWeighed }
}

/** Why there is no amount, and what to do about it. */
function saidRefusal({ changed, judgement }: WeightSituation): WeightOrderPreview['refusal'] {
  if (changed.length > 0) return { code: 'not-as-entered', field: null, detail: changed.join(' ') }
  const refusal = judgement?.amounts[0]?.refusal
  if (!refusal) return null
  const { code, field = null } = refusal
  if (code === 'no-weight') return { code, field, detail: weightOrderProblems.noWeight }
  return {
    code,
    field,
    detail: isNumberRefusalCode(code) ? sayNumberRefusal({ ...refusal, code }) : weightOrderProblems.noAmount,
  }
}

/** A dose by weight as it stands while it is being written. */
export function presentWeightPreview(fields: WeightOrderFields, found: WeightSituation): WeightOrderPreview {
  const { animal, judgement, zone } = found
  const dose = judgement?.amounts[0]?.dose ?? null
  const { accession, commonName, scientificName, countText, enclosureCode } = saidAnimal(animal, true)
  return {
    amount: dose && said(dose),
    refusal: saidRefusal(found),
    working: dose?.working.map(saidLine) ?? [],
    animal: { accession, commonName, scientificName, countText, enclosureCode },
    weight: saidWeight(animal),
    cautions: judgement?.answer.cautions.map((caution) => saidCaution(caution, zone)) ?? [],
    conditions: judgement?.answer.conditions.map((condition) => saidCondition(condition, zone)) ?? [],
    missing: missingByWeight(fields).map((field) => weightOrderMissing[field]),
  }
}
