import type { DoseRefusal } from '../domain/dose/dose-refusal.ts'
import { groupThousands } from '../domain/quantities/number-text.ts'
import type { Refusal } from '../domain/result.ts'
import { isUnitCode } from '../domain/units/is-unit-code.ts'
import type { ArithmeticRefusal } from '../domain/units/arithmetic-refusal.ts'
import { unitOf } from '../domain/units/unit-of.ts'
import type { VolumeRefusal } from '../domain/water/volume-refusal.ts'
import { arithmeticRefusals } from './arithmetic-refusals.ts'
import { doseRefusals } from './dose-refusals.ts'
import { fieldExamples, numberFields } from './number-fields.ts'
import { numberRefusals, type RefusalWords } from './number-refusals.ts'
import { unitNames } from './units.ts'
import { volumeRefusals } from './volume-refusals.ts'

/** Every refusal that the engines of units, water and dose give. */
export type NumberRefusalCode = VolumeRefusal | DoseRefusal | ArithmeticRefusal

const catalogue: Record<NumberRefusalCode, (p: RefusalWords) => string> = {
  ...numberRefusals,
  ...volumeRefusals,
  ...doseRefusals,
  ...arithmeticRefusals,
}

/**
 * A refused number in plain words that say what to do: "Type the depth of the water in metres, for example 0.68."
 *
 * @param refusal as an engine of units, water or dose returned it
 * @param label   the name of the input in a sentence, where the screen has a better one than the catalogue
 */
export function sayNumberRefusal(refusal: Refusal<NumberRefusalCode>, label?: string): string {
  return catalogue[refusal.code](wordsOf(refusal, label))
}

/** Whether a code has its sentence here; codes from outside are looked up with this first. */
export function isNumberRefusalCode(code: string): code is NumberRefusalCode {
  return Object.hasOwn(catalogue, code)
}

function wordsOf(refusal: Refusal, label: string | undefined): RefusalWords {
  const field = refusal.field?.split('.').at(-1) ?? 'value'
  const what =
    label ?? (field in numberFields ? numberFields[field as keyof typeof numberFields] : numberFields.value)
  const unit = refusal.params?.unit
  const known = isUnitCode(unit) ? unit : undefined
  const example = fieldExamples[field]
  return {
    what,
    What: what.charAt(0).toUpperCase() + what.slice(1),
    example: example === undefined ? '' : `, for example ${example}`,
    inUnit: known === undefined || unitOf(known).symbol === '' ? '' : ` in ${unitNames[known]}`,
    unit: known === undefined ? '' : unitOf(known).symbol,
    said: (key) => {
      const text = String(refusal.params?.[key] ?? '')
      return asTyped.includes(key) || !/^-?\d+(\.\d+)?$/.test(text) ? text : groupThousands(text)
    },
  }
}

/** What a person typed, or how they are to type it: never in groups, which are refused. */
const asTyped = ['typed', 'grouped', 'decimal']
