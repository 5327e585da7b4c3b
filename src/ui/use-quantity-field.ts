import { useContext, useRef, useState } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { sayNumberRefusal } from '../../shared/messages/say-number-refusal.ts'
import { readQuantityText } from './quantity-text.ts'
import { QuantityToolsContext } from './quantity-context.ts'
import type { QuantityTools } from './quantity-context.ts'

/** What a person typed: digits and unit. While it can't be read, `value` is the text itself, so that nothing is lost. */
export interface TypedQuantity {
  value: string
  unit: string
}

interface Options extends QuantityTools {
  units: readonly { unit: string; label?: string }[]
  quantity: TypedQuantity
  onChange: (next: TypedQuantity) => void
  allowNegative?: boolean
}

/**
 * The behaviour of a number-and-unit field, without its looks: reading, working out, and the question that a
 * changed unit asks.
 */
export function useQuantityField({ quantity, onChange, units, allowNegative, ...given }: Options) {
  const shown = (unit: string) => units.find((option) => option.unit === unit)?.label ?? unit
  const context = useContext(QuantityToolsContext)
  const evaluate = given.evaluate ?? context.evaluate
  const convert = given.convert ?? context.convert
  const [fault, setFault] = useState<string | undefined>()
  const [workedOut, setWorkedOut] = useState<string | undefined>()
  const [working, setWorking] = useState(false)
  const [askedUnit, setAskedUnit] = useState<string | null>(null)
  const latest = useRef(quantity.value)
  latest.current = quantity.value

  const judge = (value: string): boolean => {
    if (!allowNegative && value.startsWith('-') && Number(value) !== 0) {
      setFault(partWords.negative)
      return false
    }
    setFault(undefined)
    return true
  }

  const type = (text: string) => {
    setWorkedOut(undefined)
    // a number typed after a unit was chosen is in that unit: what is typed answers what was asked
    const unit = askedUnit ?? quantity.unit
    setAskedUnit(null)
    const read = readQuantityText(text)
    // a fault that has been pointed out goes as soon as it is mended, and a new one waits until the field is left
    if (read.kind !== 'refused') setFault(undefined)
    latest.current = text
    onChange({ value: text, unit })
  }

  const settle = async () => {
    const typed = quantity.value
    if (latest.current !== typed) return
    const read = readQuantityText(typed)
    if (read.kind === 'empty') return setFault(undefined)
    if (read.kind === 'refused') return setFault(sayNumberRefusal(read.refusal))
    if (read.kind === 'number') {
      if (judge(read.value) && read.value !== typed) onChange({ value: read.value, unit: quantity.unit })
      return
    }
    if (!evaluate) return setFault(sayNumberRefusal({ code: 'not-a-number' }))
    setWorking(true)
    const answer = await evaluate(typed, quantity.unit)
    setWorking(false)
    // typed on while it was being worked out: the answer belongs to text that is gone
    if (latest.current !== typed) return
    if (!answer.ok) return setFault(answer.says ?? partWords.cannotWorkOut)
    if (!judge(answer.value)) return
    setWorkedOut(partWords.workedOut({ typed, value: answer.value, unit: shown(quantity.unit) }))
    onChange({ value: answer.value, unit: quantity.unit })
  }

  const changeUnit = (unit: string) => {
    if (unit === quantity.unit) return
    setWorkedOut(undefined)
    const { kind } = readQuantityText(quantity.value)
    // text that is no number yet has nothing to keep or to convert
    if (kind === 'empty' || kind === 'refused') onChange({ value: quantity.value, unit })
    else setAskedUnit(unit)
  }

  const number = readQuantityText(quantity.value)
  const converted =
    askedUnit !== null && number.kind === 'number' && convert
      ? convert(number.value, quantity.unit, askedUnit)
      : undefined

  const answerUnit = (how: 'keep' | 'convert' | 'back') => {
    if (askedUnit === null) return
    if (how === 'keep') onChange({ value: quantity.value, unit: askedUnit })
    if (how === 'convert' && converted?.ok) onChange({ value: converted.value, unit: askedUnit })
    setAskedUnit(null)
  }

  return { fault, workedOut, working, askedUnit, converted, shown, type, settle, changeUnit, answerUnit }
}
