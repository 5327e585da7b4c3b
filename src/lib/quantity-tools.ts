import { quantityOf } from '../../shared/domain/units/quantity-of.ts'
import { convert } from '../../shared/domain/units/convert.ts'
import { isUnitCode } from '../../shared/domain/units/is-unit-code.ts'
import { sayNumberRefusal } from '../../shared/messages/say-number-refusal.ts'
import { workOutArithmetic } from './arithmetic.ts'

type WorkedOut = { ok: true; value: string } | { ok: false; says?: string }

/**
 * What number fields need from outside: working out typed arithmetic, and converting digits to another unit, with
 * their refusals in words.
 *
 * @param gallon what a bare "gal" is at this facility; undefined refuses it
 */
export function quantityTools(gallon?: 'us' | 'imperial'): {
  evaluate: (typed: string, unit: string) => Promise<WorkedOut>
  convert: (value: string, from: string, to: string) => WorkedOut
} {
  return {
    evaluate: async (typed, unit) => {
      if (!isUnitCode(unit)) return { ok: false }
      const answer = await workOutArithmetic(typed, unit, gallon === undefined ? {} : { gallon })
      if (answer.ok) return { ok: true, value: answer.value.text }
      return { ok: false, says: sayNumberRefusal(answer.refusal) }
    },
    convert: (value, from, to) => {
      if (!isUnitCode(from) || !isUnitCode(to)) return { ok: false }
      const answer = convert(Number(value), from, to)
      if (!answer.ok) return { ok: false, says: sayNumberRefusal(answer.refusal) }
      // twelve digits are more than any field means, and hide the noise of binary numbers
      return { ok: true, value: quantityOf(Number(answer.value.toPrecision(12)), to).value }
    },
  }
}
