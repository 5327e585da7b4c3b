import { defineRule } from '../caution-rule.ts'
import type { CautionFinding } from '../caution-rule.ts'
import { freshReading } from '../fresh-reading.ts'
import type { ReadingName } from '../reading-name.ts'
import { readingFact, readingFacts, requiredReadings } from '../required-readings.ts'

/** How old each reading may be when a dose begins. */
export const readingAgeLimits = {
  oxygenMinutes: { default: 30, unit: 'min', source: 'project-default', mark: 'P', tighter: 'lower' },
  temperatureAndPhHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
  alkalinityAndHardnessHours: {
    default: 24,
    unit: 'h',
    source: 'project-default',
    mark: 'P',
    tighter: 'lower',
  },
  copperHours: { default: 24, unit: 'h', source: 'project-default', mark: 'P', tighter: 'lower' },
} as const

/** The water tests that the agent asks for have to be fresh when the dose begins. */
export const staleReadings = defineRule({
  id: 'R31',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: readingAgeLimits,
  uses: [
    'water.kind',
    'water.oxygenMgPerL',
    'water.temperatureC',
    'water.pH',
    'water.alkalinityMgPerLCaCO3',
    'water.freeCopperMgPerL',
    'water.totalCopperMgPerL',
  ],
  findings: {
    'test-missing': ['read-water'],
    'test-old': ['read-water'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, parameters) {
    return requiredReadings(facts).flatMap((name): CautionFinding[] => {
      const maxAgeMinutes = maxAge(name, parameters)
      const reading = freshReading(readingFact(facts, name), facts.at, maxAgeMinutes)
      const base = { level: 'stop', resolvedBy: ['read-water'], unknown: [readingFacts[name]] } as const
      if (reading.state === 'unknown')
        return [{ ...base, code: 'test-missing', params: { reading: name, maxAgeMinutes } }]
      if (reading.state === 'fresh') return []
      const { at, ageMinutes } = reading
      return [{ ...base, code: 'test-old', params: { reading: name, readAt: at, ageMinutes, maxAgeMinutes } }]
    })
  },
  condition: (facts, parameters) => ({
    tests: requiredReadings(facts).map((reading) => ({
      reading,
      maxAgeMinutes: maxAge(reading, parameters),
    })),
  }),
})

function maxAge(
  name: ReadingName,
  limits: {
    oxygenMinutes: number
    temperatureAndPhHours: number
    alkalinityAndHardnessHours: number
    copperHours: number
  },
): number {
  if (name === 'oxygen') return limits.oxygenMinutes
  if (name === 'temperature' || name === 'pH') return limits.temperatureAndPhHours * 60
  if (name === 'alkalinity' || name === 'hardness') return limits.alkalinityAndHardnessHours * 60
  return limits.copperHours * 60
}
