import type { Refusal } from '../domain/result.ts'
import type { WorkingCode } from '../domain/working/working-code.ts'
import { isUnitCode } from '../domain/units/is-unit-code.ts'
import { benchWords } from '../messages/bench.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../messages/say-number-refusal.ts'
import { unitNames } from '../messages/units.ts'
import { workingLabels } from '../messages/working.ts'
import type { AnyCalculator, BenchCaution, BenchLine } from './definition.ts'

type Params = Readonly<Record<string, string | number>>

/** A word of a calculator's own catalogue; undefined where it has none. */
export function wordOf(of: AnyCalculator, key: string, params: Params = {}): string | undefined {
  if (!Object.hasOwn(of.words, key)) return undefined
  const word = of.words[key]
  return typeof word === 'function' ? word(params as never) : word
}

/** A word that has to be there; its absence is a fault in the calculator, which a test finds. */
export function say(of: AnyCalculator, key: string, params?: Params): string {
  return wordOf(of, key, params) ?? key
}

/** An option of a choice: the calculator's own word, or the unit that it names. */
export function sayOption(of: AnyCalculator, input: string, option: string): string {
  return wordOf(of, `option.${input}.${option}`) ?? (isUnitCode(option) ? unitNames[option] : option)
}

/** What a line of working works out. */
export function sayLine(of: AnyCalculator, line: BenchLine): string {
  const own = wordOf(of, `line.${line.code}`, line.params)
  if (own !== undefined) return own
  return Object.hasOwn(workingLabels, line.code)
    ? workingLabels[line.code as WorkingCode](line.params)
    : line.code
}

/** A caution in words: the calculator's own, or one of those that every calculator can give. */
export function sayCaution(of: AnyCalculator, caution: BenchCaution): string {
  const params = caution.params ?? {}
  const own = wordOf(of, `caution.${caution.code}`, params)
  if (own !== undefined) return own
  if (caution.code === 'not-plausible')
    return benchWords.notPlausible({
      what: nameInSentence(of, String(params.input)),
      shown: String(params.shown),
      band: String(params.band),
    })
  if (caution.code === 'fraction-as-percent')
    return benchWords.fractionAsPercent({
      what: nameInSentence(of, String(params.input)),
      shown: String(params.shown),
    })
  return caution.code === 'range-not-known' ? benchWords.rangeNotKnown : caution.code
}

/** "What to find" and "How it is changed" take no article in a sentence. */
const clause = /^(what|how|where|which|whether|who|when)\b/

/** "the target in the water": an input's name within a sentence. */
export function nameInSentence(of: AnyCalculator, input: string): string {
  const name = say(of, `input.${input}`)
  const second = name.charAt(1)
  const word = second === second.toLowerCase() ? name.charAt(0).toLowerCase() + name.slice(1) : name
  return clause.test(word) ? word : benchWords.the({ what: word })
}

/** Why there is no number, and what to do. */
export function sayRefusal(of: AnyCalculator, refusal: Refusal): string {
  const own = wordOf(of, `refusal.${refusal.code}`, refusal.params ?? {})
  if (own !== undefined) return own
  const input = refusal.field
  const name = input !== undefined && input in of.inputs ? nameInSentence(of, input) : undefined
  if (refusal.code === 'not-chosen') return benchWords.notChosen({ what: name ?? '' })
  if (refusal.code === 'not-an-option') return benchWords.notAnOption({ what: name ?? '' })
  if (refusal.code === 'not-whole') return benchWords.notWhole({ what: name ?? '' })
  if (refusal.code === 'specific-gravity-as-salinity') return benchWords.gravityAsSalinity
  if (refusal.code === 'not-asked') return benchWords.notAsked
  if (refusal.code === 'quantity-part-unknown')
    return benchWords.partUnknown({ what: name ?? '', part: String(refusal.params?.part ?? '') })
  if (refusal.code === 'too-near-zero') return benchWords.tooNearZero({ what: name ?? '' })
  if (refusal.code === 'result-not-finite') return benchWords.resultNotFinite
  return isNumberRefusalCode(refusal.code)
    ? sayNumberRefusal({ ...refusal, code: refusal.code }, name)
    : refusal.code
}
