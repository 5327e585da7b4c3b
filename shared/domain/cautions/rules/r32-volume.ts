import type { AgentCode } from '../../formulary/agent.ts'
import { facilityDateOf } from '../../time/facility-date.ts'
import { type CautionFinding, type CautionLevel, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { differsMuch } from '../../water/differs-much.ts'
import { readingOf } from '../caution-param.ts'

const narrowMargin: readonly AgentCode[] = ['formalin', 'copper-sulfate', 'tricaine']

/** How old a determination of a volume may be, in calendar months. */
export const volumeAgeLimit = {
  default: 12,
  unit: 'count',
  source: 'project-default',
  mark: 'P',
  tighter: 'lower',
} as const

/** An error of the volume is an error of the dose. */
export const volume = defineRule({
  id: 'R32',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {
    maxAgeMonths: volumeAgeLimit,
    maxErrorPercent: { default: 10, unit: 'percent', source: 'project-default', mark: 'P', tighter: 'lower' },
    stopErrorPercent: {
      default: 50,
      unit: 'percent',
      source: 'project-default',
      mark: 'P',
      tighter: 'lower',
    },
    differsStopFactor: { default: 5, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
    differsFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['volume.determination'],
  findings: {
    'volume-unknown': ['determine-volume'],
    'volume-other-valves': ['determine-volume'],
    'volume-gross': ['determine-volume'],
    'volume-old': ['determine-volume'],
    'volume-estimated': ['determine-volume'],
    'volume-estimated-error-unknown': ['determine-volume'],
    'volume-error-large': ['determine-volume'],
    'volume-differs': ['determine-volume'],
  },
  sources: [
    { source: 'extension-sheets', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: () => true,
  judge(facts, { maxAgeMonths, maxErrorPercent, stopErrorPercent, differsFactor, differsStopFactor }) {
    const level: CautionLevel = narrowMargin.includes(facts.agent) ? 'stop' : 'warning'
    const determined = valueOf(facts.volume.determination)
    if (!determined)
      return [
        {
          code: 'volume-unknown',
          // without a volume there is no amount, whatever the drug
          level: 'stop',
          params: {},
          resolvedBy: ['determine-volume'],
          unknown: ['volume.determination'],
        },
      ]
    const found: CautionFinding[] = []
    const base = { level, resolvedBy: ['determine-volume'] } as const
    const { determinedOn, displacementSubtracted, errorPercent, holdsForValves, method } = determined
    const { netVolumeLitres, previousLitres } = determined
    if (!holdsForValves) found.push({ ...base, code: 'volume-other-valves', params: { determinedOn } })
    // A meter and a dilution see only the water, so nothing has to be taken off.
    if (!displacementSubtracted && (method === 'geometry' || method === 'estimated'))
      found.push({ ...base, code: 'volume-gross', params: { determinedOn } })
    if (isVolumeOld(determinedOn, facilityDateOf(facts.at, facts.zone), maxAgeMonths))
      found.push({ ...base, code: 'volume-old', params: { determinedOn, limitMonths: maxAgeMonths } })
    if (method === 'estimated' && errorPercent === null)
      found.push({
        ...base,
        code: 'volume-estimated-error-unknown',
        params: { limitPercent: maxErrorPercent },
      })
    if (errorPercent !== null && exceeds(errorPercent, maxErrorPercent))
      found.push({
        ...base,
        // a volume known this badly is none for any drug
        level: exceeds(errorPercent, stopErrorPercent) ? 'stop' : level,
        code: method === 'estimated' ? 'volume-estimated' : 'volume-error-large',
        params: { errorPercent: Math.round(errorPercent * 10) / 10, limitPercent: maxErrorPercent },
      })
    if (differsMuch(netVolumeLitres, previousLitres, differsFactor))
      found.push({
        // most likely a slip of the decimal point
        level: differsMuch(netVolumeLitres, previousLitres, differsStopFactor) ? 'stop' : level,
        code: 'volume-differs',
        params: {
          now: readingOf(netVolumeLitres, 'L'),
          before: readingOf(previousLitres, 'L'),
          determinedOn,
        },
        resolvedBy: ['determine-volume'],
      })
    return found
  },
})

/**
 * Whether a determination of a volume is older than it may be.
 *
 * @param determinedOn facility date of the measurement
 * @param today        facility date
 * @param maxAgeMonths whole calendar months; of exactly that age it still counts
 */
export function isVolumeOld(determinedOn: string, today: string, maxAgeMonths: number): boolean {
  return today > addMonths(determinedOn, maxAgeMonths)
}

/** The same day so many months later; as text to compare with, so that 31 + 1 month need not exist. */
function addMonths(date: string, months: number): string {
  const [year = '0', month = '1', day = '1'] = date.split('-')
  const all = Number(year) * 12 + Number(month) - 1 + Math.floor(months)
  return `${String(Math.floor(all / 12)).padStart(4, '0')}-${String((all % 12) + 1).padStart(2, '0')}-${day}`
}
