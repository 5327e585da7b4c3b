import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { isSpecies, namesOf } from '../inhabitants.ts'
import { warmestTemperatureC } from '../warmest-temperature.ts'

/** The label's limits for ponds: not above 27 °C, not in a bloom, not with striped bass. */
export const formalinPond = defineRule({
  id: 'R03',
  levels: ['stop'],
  when: 'design',
  overridable: true,
  parameters: {
    warmestC: { default: 27, unit: 'degC', source: 'cfr-529-1030', mark: 'V', tighter: 'lower' },
    windowHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: [
    'order.setting',
    'water.temperatureC',
    'water.recentTemperaturesC',
    'water.hasBloom',
    'animals.inWater',
  ],
  findings: {
    'pond-warm': ['wait-for-cooler-water'],
    'pond-temperature-unknown': ['read-temperature'],
    'pond-bloom': ['choose-other-agent'],
    'pond-bloom-unknown': ['look-for-bloom'],
    'pond-striped-bass': ['move-animals', 'choose-other-agent'],
    'inhabitants-unknown': ['record-inhabitants'],
  },
  sources: [{ source: 'cfr-529-1030', mark: 'V' }],
  concerns: ({ agent, order }) => agent === 'formalin' && valueOf(order.setting) === 'pond',
  judge(facts, { warmestC, windowHours }) {
    const found: CautionFinding[] = []
    const limit = readingOf(warmestC, 'degC')
    const temperatureC = warmestTemperatureC(facts, windowHours)
    if (temperatureC === null)
      found.push({
        code: 'pond-temperature-unknown',
        level: 'stop',
        params: { limit },
        resolvedBy: ['read-temperature'],
        unknown: ['water.temperatureC'],
      })
    else if (exceeds(temperatureC, warmestC))
      found.push({
        code: 'pond-warm',
        level: 'stop',
        params: { temperature: readingOf(temperatureC, 'degC'), limit },
        resolvedBy: ['wait-for-cooler-water'],
      })
    const hasBloom = valueOf(facts.water.hasBloom)
    if (hasBloom === true)
      found.push({ code: 'pond-bloom', level: 'stop', params: {}, resolvedBy: ['choose-other-agent'] })
    if (hasBloom === null && facts.water.hasBloom.state === 'unknown')
      found.push({
        code: 'pond-bloom-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['look-for-bloom'],
        unknown: ['water.hasBloom'],
      })
    const inWater = valueOf(facts.animals.inWater)
    const bass = inWater?.filter((animal) => isSpecies(animal, 'Morone saxatilis')) ?? []
    if (inWater === null)
      found.push({
        code: 'inhabitants-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['record-inhabitants'],
        unknown: ['animals.inWater'],
      })
    if (bass.length > 0)
      found.push({
        code: 'pond-striped-bass',
        level: 'stop',
        params: { animals: namesOf(bass) },
        resolvedBy: ['move-animals', 'choose-other-agent'],
      })
    return found
  },
})
