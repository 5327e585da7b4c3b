import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { bandForStage, judgeWeight } from '../../../shared/domain/animals/judge-weight.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { weightDoubts } from '../../../shared/messages/animal-refusals.ts'
import { animalWords, rangeWords } from '../../../shared/messages/animal-sheet.ts'
import { bandText, enteredWeight, massText, shownMassUnit } from './weight-text.ts'

/** Units that animals are weighed in, as a form offers them. */
export const weighUnits = [
  { unit: 'g' },
  { unit: 'kg' },
  { unit: 'mg' },
  { unit: 'lb' },
  { unit: 'oz_av', label: 'oz' },
]

export interface JudgedWeight {
  /** As it will stand in a sentence; empty while it can't be read. */
  text: string
  /** The weight of one, when several lay on the balance. */
  ofOne: string | undefined
  /** What is plausible, for the line under the field. */
  range: string | undefined
  /** Why it is asked back. */
  asks: string | undefined
}

/** The same judgement that the server makes, while the weight is typed. */
export function judgeTypedWeight(
  animal: Pick<Animal, 'weightBand' | 'stage' | 'newestWeight' | 'taxon'>,
  typed: { value: string; unit: string },
  animalsWeighed: number,
): JudgedWeight {
  const stored = animal.weightBand
  const words = stored ? bandText(stored, rangeWords.between) : ''
  const range = stored ? animalWords.plausible({ range: words }) : undefined
  const parsed = parseQuantity(typed, { dimension: 'mass', above: 0 })
  if (!parsed.ok || animalsWeighed < 1) return { text: '', ofOne: undefined, range, asks: undefined }
  const kg = parsed.value.value / 1000 / animalsWeighed
  const unit = shownMassUnit(typed.unit, undefined)
  const one = massText(kg, unit).text
  const text = enteredWeight(parsed.value.entered).text
  const band = stored ? bandForStage([stored], animal.stage) : null
  const judged = judgeWeight(kg, band, animal.newestWeight?.weightKg ?? null)
  const doubt = judged.ok && judged.value.verdict === 'needs-confirmation' ? judged.value.doubt : null
  return {
    text,
    ofOne: animalsWeighed > 1 ? one : undefined,
    range,
    asks:
      doubt === null
        ? undefined
        : weightDoubts[doubt]({
            weight: animalsWeighed > 1 ? one : text,
            taxon: animal.taxon.commonName,
            band: words,
            newest: animal.newestWeight ? massText(animal.newestWeight.weightKg, unit).text : '',
          }),
  }
}
