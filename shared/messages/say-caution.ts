import type { Caution, CautionCondition } from '../domain/cautions/evaluate-cautions.ts'
import type {
  CautionParam,
  CautionQuantity,
  NamedAnimal,
  RequiredTest,
} from '../domain/cautions/caution-param.ts'
import { type StartRuleId, startRuleIds } from '../domain/cautions/caution-rule.ts'
import { formatDose } from '../domain/quantities/format-dose.ts'
import { formatReading } from '../domain/quantities/format-reading.ts'
import { unitOf } from '../domain/units/unit-of.ts'
import { cautionConditions } from './caution-conditions.ts'
import { cautionTexts, cautionTitles } from './caution-texts.ts'
import {
  cautionRuleWords,
  cautionWaterWords,
  formalinRowWords,
  readingWords,
  resolveWords,
  secondCalculationWords,
} from './cautions.ts'
import { counted } from './define-messages.ts'
import { agentNames } from './formulary.ts'
import { sayDate, sayInstant } from './say-date.ts'
import { sayLoosened, sayLoosenedInShort } from './say-parameter.ts'

/** A caution in words, as on screen and in print. */
export interface SaidCaution {
  title: string
  text: string
  /** Any one of these would resolve it. */
  resolves: string[]
}

/** Words for a fired rule. @param zone the facility's zone, for times of day */
export function sayCaution(caution: Caution, zone: string): SaidCaution {
  const text = cautionTexts[caution.code] as (params: Record<string, string | number>) => string
  return {
    title: cautionTitles[caution.code],
    text: [text(sayParams(caution.params, zone)), ...sayLoosened(caution.settings)].join(' '),
    resolves: caution.resolvedBy.map((code) => resolveWords[code]),
  }
}

/** The sentence of a condition, without a full stop: it stands in a list of steps. */
export function sayCondition(condition: CautionCondition, zone: string): string {
  const id = startRuleIds.find((one): one is StartRuleId => one === condition.ruleId)
  if (id === undefined) return cautionRuleWords[condition.ruleId]
  const sentence = cautionConditions[id] as (params: Record<string, string | number>) => string
  return `${sentence(sayParams(condition.params, zone))}${sayLoosenedInShort(condition.settings)}`
}

function sayParams(params: object, zone: string): Record<string, string | number> {
  const entries = Object.entries(params) as [string, CautionParam][]
  return Object.fromEntries(entries.map(([name, value]) => [name, sayParam(name, value, zone)]))
}

function sayParam(name: string, value: CautionParam, zone: string): string | number {
  if (typeof value === 'number') return value
  if (typeof value === 'string') return sayText(name, value, zone)
  if (isQuantity(value)) return sayQuantity(value)
  const items: readonly (string | NamedAnimal | RequiredTest)[] = value
  return items.map(sayItem).join(', ')
}

function sayText(name: string, value: string, zone: string): string {
  if (name.endsWith('On')) return sayDate(value)
  if (name.endsWith('At')) return sayInstant(value, zone)
  if (name === 'reading') return readingWords[value as keyof typeof readingWords]
  if (name === 'row') return formalinRowWords[value as keyof typeof formalinRowWords]
  if (name === 'lineWater' || name === 'water')
    return cautionWaterWords[value as keyof typeof cautionWaterWords]
  if (name === 'agent') return agentNames[value as keyof typeof agentNames]
  if (name === 'because') return secondCalculationWords[value as keyof typeof secondCalculationWords]
  return value
}

function sayItem(item: string | NamedAnimal | RequiredTest): string {
  if (typeof item === 'string') return item
  if ('reading' in item) {
    const { reading, maxAgeMinutes } = item
    const age =
      maxAgeMinutes < 120
        ? counted(maxAgeMinutes, 'minute', 'minutes')
        : counted(Math.round((maxAgeMinutes / 60) * 10) / 10, 'hour', 'hours')
    return `${readingWords[reading]} within ${age}`
  }
  return `${item.commonName} (${item.label}) in ${item.enclosureCode}`
}

function sayQuantity({ quantity, value, unit, digits }: CautionQuantity): string {
  // Six digits are more than any dose is known to, and few enough to read after a conversion.
  if (quantity === 'dose') return formatDose(Number(value.toPrecision(6)), unit).text
  return formatReading({ value: digits ?? String(Number(value.toFixed(unitOf(unit).places))), unit }).text
}

function isQuantity(value: CautionParam): value is CautionQuantity {
  return typeof value === 'object' && 'quantity' in value
}
