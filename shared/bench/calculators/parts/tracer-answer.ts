import { ok, refuse, type Result } from '../../../domain/result.ts'
import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { volumeByTracer, type TracerVolume } from '../../../domain/water/volume-by-tracer.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'
import { valueTerm } from '../../../domain/working/value-term.ts'
import type { Outcome } from '../../definition.ts'
import { line } from '../../line.ts'

const mgPerGram = 1000
const percent = 100

/** What was stirred in, and the readings around it. */
export interface GivenTracer {
  saltMass: ParsedQuantity | undefined
  purity: ParsedQuantity | undefined
  dyeAmount: ParsedQuantity | undefined
  dyeStrength: ParsedQuantity | undefined
  before: ParsedQuantity | undefined
  after: ParsedQuantity | undefined
  readingError: ParsedQuantity | undefined
  error: ParsedQuantity | undefined
}

interface Tracer {
  addedMg: number
  /** The amount as an expression. */
  term: string
  found: TracerVolume
}

/** Milligrams of what the instrument reads, and the input that they come from. */
function added({ saltMass, purity, dyeAmount, dyeStrength }: GivenTracer): Result<{
  milligrams: number
  term: string
  input: string
}> {
  if (saltMass) {
    const share = purity ? purity.value / percent : 1
    const term = purity ? `${enteredTerm(saltMass)} * ${enteredTerm(purity)} / 100` : enteredTerm(saltMass)
    return ok({ milligrams: saltMass.value * mgPerGram * share, term, input: 'saltMass' })
  }
  if (!dyeAmount) return refuse('blank', 'dyeAmount', { unit: 'g' })
  if (dyeAmount.unit === 'g')
    return ok({ milligrams: dyeAmount.value * mgPerGram, term: enteredTerm(dyeAmount), input: 'dyeAmount' })
  if (!dyeStrength) return refuse('dye-strength-missing', 'dyeStrength')
  return ok({
    milligrams: dyeAmount.value * dyeStrength.value,
    term: `${enteredTerm(dyeAmount)} * ${enteredTerm(dyeStrength)}`,
    input: 'dyeAmount',
  })
}

/** The volume by what was stirred in, with the amount that it was. */
export function tracerOf(given: GivenTracer): Result<Tracer> {
  const amount = added(given)
  if (!amount.ok) return amount
  const { milligrams, term, input } = amount.value
  const found = volumeByTracer({
    addedMg: milligrams,
    beforeMgPerL: given.before?.value ?? 0,
    afterMgPerL: given.after?.value ?? 0,
    readingErrorMgPerL: given.readingError?.value ?? 0,
    addedErrorPercent: given.error?.value ?? 0,
  })
  if (found.ok) return ok({ addedMg: milligrams, term, found: found.value })
  const { refusal } = found
  return refusal.field === 'addedMg' ? { ok: false, refusal: { ...refusal, field: input } } : found
}

/** The answer of a volume by what was stirred in. */
export function tracerOutcome(given: GivenTracer): Result<Outcome> {
  const { before, after } = given
  if (!before || !after) return refuse('blank', 'after', { unit: 'g/L' })
  const tracer = tracerOf(given)
  if (!tracer.ok) return tracer
  const { addedMg, term, found } = tracer.value
  const { riseMgPerL, litres, low, high } = found
  return ok({
    figures: [
      { key: 'net', value: litres, unit: 'L', kind: 'volume' },
      { key: 'rise', value: riseMgPerL, unit: 'mg/L', kind: 'reading' },
    ],
    working: [
      line('added', `${term} to mg`, addedMg, 'mg'),
      line('rise', `${enteredTerm(after)} - ${enteredTerm(before)} to mg/L`, riseMgPerL, 'mg/L'),
      line('net', `${valueTerm(addedMg, 'mg')} / (${valueTerm(riseMgPerL, 'mg/L')}) to L`, litres, 'L', [
        'added',
        'rise',
      ]),
    ],
    ...(high > low ? { range: { low, high } } : {}),
  })
}
