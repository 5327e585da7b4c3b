import type { ListedParameter } from '../../../shared/contracts/caution-rules.contract.ts'
import type { RuleParameter } from '../../../shared/domain/cautions/caution-rule.ts'
import { markNames } from '../../../shared/messages/formulary-screens.ts'
import { sayParameterValue } from '../../../shared/messages/say-parameter.ts'

/** Least and most that a facility may confirm, with their units. */
export function sayLimits({ least, most, unit }: ListedParameter): { least: string; most: string } {
  const say = (value: number) => sayParameterValue(value, unit as RuleParameter['unit'])
  return { least: say(least), most: say(most) }
}

/** A mark with what it means; one that this version has no words for stands alone. */
export const sayMark = (mark: string): string =>
  Object.hasOwn(markNames, mark) ? `${mark}: ${markNames[mark as keyof typeof markNames]}` : mark
