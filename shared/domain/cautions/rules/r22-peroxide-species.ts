import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import type { AnimalInWater } from '../caution-facts.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { isEgg, isFinfish, isSpecies, namesOf } from '../inhabitants.ts'
import { warmestTemperatureC } from '../warmest-temperature.ts'

/** Species and stages that the label of hydrogen peroxide excludes or warns of, and warm water. */
export const peroxideSpecies = defineRule({
  id: 'R22',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: {
    eggsFromDtu: { default: 70, unit: 'count', source: 'cfr-529-1150', mark: 'V', tighter: 'lower' },
    eggsToDtu: { default: 140, unit: 'count', source: 'cfr-529-1150', mark: 'V', tighter: 'higher' },
    warmC: { default: 20, unit: 'degC', source: 'treatment-practice', mark: 'M', tighter: 'lower' },
    windowHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: ['animals.inWater', 'water.temperatureC', 'water.recentTemperaturesC'],
  findings: {
    'inhabitants-unknown': ['record-inhabitants'],
    'peroxide-excluded': ['choose-other-agent', 'move-animals'],
    'peroxide-walleye': ['test-some-first'],
    'peroxide-eggs': ['test-some-first'],
    'peroxide-eggs-age-unknown': ['record-inhabitants', 'test-some-first'],
    'peroxide-warm': ['cool-water', 'lower-target'],
    'peroxide-temperature-unknown': ['read-temperature'],
  },
  sources: [
    { source: 'cfr-529-1150', mark: 'V' },
    { source: 'treatment-practice', mark: 'M' },
  ],
  concerns: ({ agent }) => agent === 'hydrogen-peroxide',
  judge(facts, { eggsFromDtu, eggsToDtu, warmC, windowHours }) {
    const found: CautionFinding[] = []
    const inWater = valueOf(facts.animals.inWater)
    if (inWater === null)
      found.push({
        code: 'inhabitants-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['record-inhabitants'],
        unknown: ['animals.inWater'],
      })
    const named = (which: (animal: AnimalInWater) => boolean) => inWater?.filter(which) ?? []
    const excluded = named(isExcluded)
    if (excluded.length > 0)
      found.push({
        code: 'peroxide-excluded',
        level: 'stop',
        params: { animals: namesOf(excluded) },
        resolvedBy: ['choose-other-agent', 'move-animals'],
      })
    const walleye = named((animal) => isSpecies(animal, 'Sander vitreus'))
    if (walleye.length > 0)
      found.push({
        code: 'peroxide-walleye',
        level: 'warning',
        params: { animals: namesOf(walleye) },
        resolvedBy: ['test-some-first'],
      })
    const range = { from: eggsFromDtu, to: eggsToDtu }
    const eggs = named((animal) => isEgg(animal) && isFinfish(animal))
    const sensitive = eggs.filter(
      ({ dailyTemperatureUnits: age }) => age !== null && age >= eggsFromDtu && age <= eggsToDtu,
    )
    if (sensitive.length > 0)
      found.push({
        code: 'peroxide-eggs',
        level: 'warning',
        params: { animals: namesOf(sensitive), ...range },
        resolvedBy: ['test-some-first'],
      })
    const ageless = eggs.filter(({ dailyTemperatureUnits }) => dailyTemperatureUnits === null)
    if (ageless.length > 0)
      found.push({
        code: 'peroxide-eggs-age-unknown',
        level: 'warning',
        params: { animals: namesOf(ageless), ...range },
        resolvedBy: ['record-inhabitants', 'test-some-first'],
        unknown: ['animals.inWater'],
      })
    const limit = readingOf(warmC, 'degC')
    const warmestC = warmestTemperatureC(facts, windowHours)
    if (warmestC === null)
      found.push({
        code: 'peroxide-temperature-unknown',
        level: 'warning',
        params: { limit },
        resolvedBy: ['read-temperature'],
        unknown: ['water.temperatureC'],
      })
    else if (exceeds(warmestC, warmC))
      found.push({
        code: 'peroxide-warm',
        level: 'warning',
        params: { temperature: readingOf(warmestC, 'degC'), limit },
        resolvedBy: ['cool-water', 'lower-target'],
      })
    return found
  },
})

/** Northern pike and paddlefish at any stage but the egg; pallid sturgeon as fry, or where the stage is not told. */
function isExcluded(animal: AnimalInWater): boolean {
  if (isEgg(animal)) return false
  if (isSpecies(animal, 'Esox lucius') || isSpecies(animal, 'Polyodon spathula')) return true
  const mayBeFry = ['larva', 'fry', 'mixed', 'unknown'].includes(animal.lifeStage)
  return mayBeFry && isSpecies(animal, 'Scaphirhynchus albus')
}
