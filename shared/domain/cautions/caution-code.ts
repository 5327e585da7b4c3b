import type { AgentCode } from '../formulary/agent.ts'
import type { WaterKind } from '../formulary/dose-line.ts'
import type { ReadingName } from './reading-name.ts'
import type { CautionQuantity, NamedAnimal } from './caution-param.ts'

/**
 * What each finding tells, for its sentence. Names end in `On` for facility dates and in `At` for instants; quantities
 * say whether they are a dose or a reading, because the two are written by different rules.
 */
export interface CautionParams {
  'oxygen-unknown': { floor: CautionQuantity; maxAgeMinutes: number }
  'oxygen-old': { oxygen: CautionQuantity; readAt: string; ageMinutes: number; maxAgeMinutes: number }
  'oxygen-low': { oxygen: CautionQuantity; floor: CautionQuantity }
  'oxygen-would-fall': {
    oxygen: CautionQuantity
    takes: CautionQuantity
    predicted: CautionQuantity
    floor: CautionQuantity
  }
  'oxygen-fall-unknown': { takes: CautionQuantity; floor: CautionQuantity }
  'pond-warm': { temperature: CautionQuantity; limit: CautionQuantity }
  'pond-temperature-unknown': { limit: CautionQuantity }
  'pond-bloom': Record<never, never>
  'pond-bloom-unknown': Record<never, never>
  'pond-striped-bass': { animals: readonly NamedAnimal[] }
  'formalin-too-long': { minutes: number; limitMinutes: number; row: FormalinRow }
  'formalin-too-long-for-strength': {
    minutes: number
    limitMinutes: number
    target: CautionQuantity
    limit: CautionQuantity
  }
  'formalin-indefinite': { target: CautionQuantity; limit: CautionQuantity }
  'formalin-indefinite-not-allowed': { limitMinutes: number; row: FormalinRow }
  'formalin-time-unknown': { limitMinutes: number }
  'formalin-over-ceiling': { target: CautionQuantity; ceiling: CautionQuantity; row: FormalinRow }
  'formalin-over-salmonid-ceiling': {
    target: CautionQuantity
    ceiling: CautionQuantity
    temperature: CautionQuantity
    boundary: CautionQuantity
  }
  'formalin-salmonid-temperature-unknown': {
    target: CautionQuantity
    ceiling: CautionQuantity
    boundary: CautionQuantity
  }
  'formalin-in-warm-water': {
    target: CautionQuantity
    limit: CautionQuantity
    temperature: CautionQuantity
    boundary: CautionQuantity
  }
  'formalin-temperature-unknown': {
    target: CautionQuantity
    limit: CautionQuantity
    boundary: CautionQuantity
  }
  'formalin-storage-fault': Record<never, never>
  'formalin-storage-unknown': Record<never, never>
  'formalin-and-permanganate': { orderNumber: string; hours: number; limitHours: number }
  'formalin-and-permanganate-together': { orderNumber: string; limitHours: number }
  'agent-history-unknown': Record<never, never>
  'inhabitants-unknown': Record<never, never>
  'copper-invertebrates': { animals: readonly NamedAnimal[] }
  'copper-elasmobranchs': { animals: readonly NamedAnimal[] }
  'alkalinity-unknown': { floor: CautionQuantity; maxAgeHours: number }
  'alkalinity-old': { alkalinity: CautionQuantity; readAt: string; maxAgeHours: number }
  'alkalinity-low': { alkalinity: CautionQuantity; floor: CautionQuantity }
  'copper-over-alkalinity': { target: CautionQuantity; limit: CautionQuantity; alkalinity: CautionQuantity }
  'copper-over-cap': { target: CautionQuantity; limit: CautionQuantity }
  'copper-target-high': { target: CautionQuantity; limit: CautionQuantity }
  'copper-high': { reading: CautionQuantity; limit: CautionQuantity }
  'copper-very-high': { reading: CautionQuantity; limit: CautionQuantity }
  'copper-low': { reading: CautionQuantity; limit: CautionQuantity }
  'copper-reading-missing': { maxAgeHours: number }
  'copper-forms-mixed': { orderNumber: string }
  'copper-reducer': Record<never, never>
  'copper-reducer-unknown': Record<never, never>
  'carbon-on': Record<never, never>
  'carbon-unknown': Record<never, never>
  'ozone-on': Record<never, never>
  'ozone-unknown': Record<never, never>
  'uv-on': Record<never, never>
  'uv-unknown': Record<never, never>
  'fractionator-on': Record<never, never>
  'fractionator-unknown': Record<never, never>
  'chloroquine-invertebrates': { animals: readonly NamedAnimal[] }
  'chloroquine-algae': Record<never, never>
  'chloroquine-algae-unknown': Record<never, never>
  'chloroquine-lights': Record<never, never>
  'chloroquine-lights-unknown': Record<never, never>
  'tricaine-unbuffered': Record<never, never>
  'tricaine-buffer-unknown': Record<never, never>
  'tricaine-acid': { reading: CautionQuantity; limit: CautionQuantity }
  'tricaine-ph-unknown': { limit: CautionQuantity; maxAgeHours: number }
  'tricaine-ph-differs': { reading: CautionQuantity; home: CautionQuantity; limit: CautionQuantity }
  'tricaine-home-ph-unknown': { limit: CautionQuantity; maxAgeHours: number }
  'food-or-release-unknown': Record<never, never>
  'food-or-release-not-said': { animals: readonly NamedAnimal[] }
  'prohibited-in-food': { animals: readonly NamedAnimal[] }
  'tricaine-food-family': { animals: readonly NamedAnimal[] }
  'tricaine-food-cold': { temperature: CautionQuantity; limit: CautionQuantity }
  'tricaine-food-temperature-unknown': { limit: CautionQuantity }
  'tricaine-food-hold': { animals: readonly NamedAnimal[]; days: number }
  'peroxide-excluded': { animals: readonly NamedAnimal[] }
  'peroxide-walleye': { animals: readonly NamedAnimal[] }
  'peroxide-eggs': { animals: readonly NamedAnimal[]; from: number; to: number }
  'peroxide-eggs-age-unknown': { animals: readonly NamedAnimal[]; from: number; to: number }
  'peroxide-warm': { temperature: CautionQuantity; limit: CautionQuantity }
  'peroxide-temperature-unknown': { limit: CautionQuantity }
  'chloramine-acid': { reading: CautionQuantity; limit: CautionQuantity }
  'chloramine-soft': { reading: CautionQuantity; limit: CautionQuantity }
  'chloramine-unknown': { reading: ReadingName }
  'permanganate-alkaline': { reading: CautionQuantity; limit: CautionQuantity }
  'permanganate-hard': { reading: CautionQuantity; limit: CautionQuantity }
  'permanganate-unknown': { reading: ReadingName }
  'permanganate-total': { total: CautionQuantity; limit: CautionQuantity }
  'permanganate-total-unknown': { limit: CautionQuantity }
  'permanganate-repeated': { orderNumber: string; limitDays: number }
  'biofilter-on': Record<never, never>
  'biofilter-unknown': Record<never, never>
  'over-default': { target: CautionQuantity; high: CautionQuantity; factor: number }
  'far-over-default': { target: CautionQuantity; high: CautionQuantity; factor: number }
  'under-default': { target: CautionQuantity; low: CautionQuantity }
  'no-default-range': Record<never, never>
  'default-not-comparable': Record<never, never>
  'no-line-fits': Record<never, never>
  'line-not-named': { target: CautionQuantity; high: CautionQuantity }
  'beyond-every-line': { target: CautionQuantity; high: CautionQuantity; limitFactor: number }
  'line-water-unknown': { lineWater: WaterKind }
  'line-of-other-water': { lineWater: WaterKind; water: 'fresh' | 'brackish' | 'marine' }
  'left-in-bath-line': Record<never, never>
  'left-in-over-line': { limitMinutes: number }
  'contact-over-line': { minutes: number; limitMinutes: number }
  'contact-far-over-line': { minutes: number; limitMinutes: number }
  'day-over-line': { minutes: number; limitMinutes: number }
  'day-far-over-line': { minutes: number; limitMinutes: number }
  'contact-over-untimed-line': { minutes: number; limitMinutes: number }
  'contact-far-over-untimed-line': { minutes: number; limitMinutes: number }
  'doses-add-up': DosesTogether
  'dose-on-dose': DosesTogether & { stillIn: number }
  'basis-missing': Record<never, never>
  'dose-early': { hours: number; earliestHours: number }
  'dose-very-early': { hours: number; intervalHours: number }
  'interval-within-contact': { intervalHours: number; contactMinutes: number }
  'dose-late': { hours: number; latestHours: number }
  'doses-past-plan': { given: number; planned: number }
  'same-agent-together': { orderNumber: string }
  'same-agent-same-day': { orderNumber: string }
  'agents-not-together': { orderNumber: string; agent: AgentCode }
  'agent-in-water': { orderNumber: string; agent: AgentCode }
  'agent-same-day': { orderNumber: string; agent: AgentCode }
  'start-past': { startsAt: string }
  'start-far': { startsAt: string; limitDays: number }
  'plan-long': { days: number; limitDays: number }
  'doses-carried': { given: number; planned: number; lastAt: string; startsAt: string }
  'plan-counts-given': { given: number; planned: number; lastAt: string; startsAt: string }
  'nitrogen-unknown': { reading: ReadingName; maxAgeHours: number }
  'nitrogen-before-unknown': { reading: ReadingName }
  'nitrogen-rising': {
    reading: ReadingName
    value: CautionQuantity
    before: CautionQuantity
    factor: number
  }
  'unionised-ammonia-high': { value: CautionQuantity; limit: CautionQuantity }
  'unionised-ammonia-unknown': { limit: CautionQuantity }
  'room-not-aired': { places: readonly string[]; minutes: number; reentryAt: string }
  'room-air-unknown': { places: readonly string[]; minutes: number; reentryAt: string }
  'itraconazole-from-bulk': Record<never, never>
  'itraconazole-source-unknown': Record<never, never>
  'animal-uses-unknown': Record<never, never>
  'anti-inflammatories-together': { orderNumber: string; agent: AgentCode; limitHours: number }
  'test-missing': { reading: ReadingName; maxAgeMinutes: number }
  'test-old': { reading: ReadingName; readAt: string; ageMinutes: number; maxAgeMinutes: number }
  'volume-unknown': Record<never, never>
  'volume-other-valves': { determinedOn: string }
  'volume-gross': { determinedOn: string }
  'volume-old': { determinedOn: string; limitMonths: number }
  'volume-estimated': { errorPercent: number; limitPercent: number }
  'volume-estimated-error-unknown': { limitPercent: number }
  'volume-error-large': { errorPercent: number; limitPercent: number }
  'volume-differs': { now: CautionQuantity; before: CautionQuantity; determinedOn: string }
  'weight-unknown': Record<never, never>
  'weight-missing': { animals: readonly string[] }
  'weight-old': { animals: readonly string[]; limitDays: number }
  'weight-implausible': { animals: readonly string[] }
  'weight-estimated': { animals: readonly string[] }
  'lot-expired': { expiresOn: string }
  'lot-expiry-unknown': Record<never, never>
  'lot-recalled': Record<never, never>
  'lot-quarantined': Record<never, never>
  'lot-status-unknown': Record<never, never>
  'lot-beyond-use': { beyondUseOn: string }
  'lot-beyond-use-unknown': Record<never, never>
  'second-calculation': { because: SecondCalculationCause }
  'animals-unwell': { percent: number; limitPercent: number }
  'animals-unwell-unknown': { limitPercent: number }
  'animals-handled': Record<never, never>
  'animals-handled-unknown': Record<never, never>
  'first-use': { taxa: readonly string[] }
  'first-use-unknown': Record<never, never>
}

/** Doses that stay in the water, and what they make together beside the upper end of a dose line. */
interface DosesTogether {
  doses: number
  target: CautionQuantity
  total: CautionQuantity
  high: CautionQuantity
  factor: number
}

export type CautionCode = keyof CautionParams

/** Rows of the label of formalin that a caution may name. */
export type FormalinRow =
  'finfish' | 'egg' | 'sturgeon-egg' | 'penaeid-tank' | 'penaeid-pond' | 'inhabitants-unknown'

export type SecondCalculationCause = 'hazard' | 'volume' | 'amount' | 'not-known'

/** What would resolve a caution; each is one thing that a person can do. */
export type ResolveCode =
  | 'read-oxygen'
  | 'raise-oxygen'
  | 'aerate-and-log'
  | 'lower-target'
  | 'shorten-contact'
  | 'state-contact-time'
  | 'read-temperature'
  | 'cool-water'
  | 'wait-for-cooler-water'
  | 'look-for-bloom'
  | 'choose-other-agent'
  | 'choose-other-water'
  | 'move-animals'
  | 'part-the-water'
  | 'record-inhabitants'
  | 'look-at-the-bottle'
  | 'use-other-lot'
  | 'record-lot'
  | 'wait-between-agents'
  | 'record-history'
  | 'read-alkalinity'
  | 'raise-alkalinity'
  | 'read-copper'
  | 'hold-copper'
  | 'add-copper'
  | 'choose-one-copper'
  | 'take-reducer-out'
  | 'carbon-off'
  | 'ozone-off'
  | 'uv-off'
  | 'fractionator-off'
  | 'biofilter-off'
  | 'say-whether-biofilter'
  | 'air-the-room'
  | 'keep-people-out'
  | 'dim-lights'
  | 'read-water'
  | 'correct-water'
  | 'test-nitrogen'
  | 'feed-less'
  | 'change-water'
  | 'buffer-the-bath'
  | 'say-whether-buffered'
  | 'say-food-or-release'
  | 'warm-water'
  | 'hold-animals'
  | 'test-some-first'
  | 'declare-experience'
  | 'check-figure'
  | 'raise-target'
  | 'choose-dose-line'
  | 'confirm-dose-line'
  | 'state-basis'
  | 'state-water-kind'
  | 'take-agent-out'
  | 'wait-for-window'
  | 'amend-order'
  | 'check-start'
  | 'check-plan'
  | 'determine-volume'
  | 'weigh-animals'
  | 'calculate-again-by-another'
  | 'let-animals-rest'
  | 'look-at-animals'
