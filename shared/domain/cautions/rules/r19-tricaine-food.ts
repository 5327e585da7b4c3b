import type { AnimalInWater } from '../caution-facts.ts'
import { readingOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { foodNotKnown } from '../food-not-known.ts'
import { coldestTemperatureC } from '../warmest-temperature.ts'

/**
 * Genera of the catfish, pike and perch families of the label; salmonids are a group of their own.
 *
 * @source project-default: the families are the label's, which genera belong to them is from memory (M)
 */
const labelGenera = [
  ...['ameiurus', 'ictalurus', 'noturus', 'prietella', 'pylodictis', 'satan', 'trogloglanis'],
  'esox',
  ...['ammocrypta', 'crystallaria', 'etheostoma', 'gymnocephalus', 'perca', 'percarina', 'percina'],
  ...['romanichthys', 'sander', 'zingel'],
]

const isOfLabel = ({ taxonGroup, scientificName }: AnimalInWater): boolean =>
  taxonGroup === 'salmonid' || labelGenera.includes(scientificName.trim().toLowerCase().split(/\s+/)[0] ?? '')

/**
 * The label of tricaine for fish that may be eaten: four families, water above 10 °C, and 21 days before harvest. At
 * the boundary the coldest water of the last hours counts.
 */
export const tricaineFood = defineRule({
  id: 'R19',
  levels: ['stop', 'note'],
  when: 'design',
  overridable: true,
  parameters: {
    coldestC: { default: 10, unit: 'degC', source: 'cfr-529-2503', mark: 'V', tighter: 'higher' },
    windowHours: { default: 4, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
    withdrawalDays: { default: 21, unit: 'd', source: 'cfr-529-2503', mark: 'V', tighter: 'higher' },
  },
  uses: ['animals.foodOrRelease', 'animals.inWater', 'water.temperatureC', 'water.recentTemperaturesC'],
  findings: {
    'food-or-release-unknown': ['say-food-or-release'],
    'food-or-release-not-said': ['say-food-or-release'],
    'tricaine-food-family': ['choose-other-agent', 'move-animals'],
    'tricaine-food-cold': ['warm-water', 'choose-other-agent'],
    'tricaine-food-temperature-unknown': ['read-temperature'],
    'tricaine-food-hold': ['hold-animals'],
  },
  effects: ['holdUntil'],
  sources: [{ source: 'cfr-529-2503', mark: 'V' }],
  concerns: ({ agent }) => agent === 'tricaine',
  judge(facts, { coldestC, windowHours, withdrawalDays }) {
    const { foodOrRelease, inWater } = facts.animals
    const found: CautionFinding[] = foodNotKnown(foodOrRelease)
    const animals = valueOf(foodOrRelease)?.yes ?? []
    if (animals.length === 0) return found
    const known = valueOf(inWater) ?? []
    const outside = animals.filter(({ label }) => !known.some((one) => one.label === label && isOfLabel(one)))
    if (outside.length > 0)
      found.push({
        code: 'tricaine-food-family',
        level: 'stop',
        params: { animals: outside },
        resolvedBy: ['choose-other-agent', 'move-animals'],
      })
    const limit = readingOf(coldestC, 'degC')
    const coldest = coldestTemperatureC(facts, windowHours)
    if (coldest === null)
      found.push({
        code: 'tricaine-food-temperature-unknown',
        level: 'stop',
        params: { limit },
        resolvedBy: ['read-temperature'],
        unknown: ['water.temperatureC'],
      })
    else if (!exceeds(coldest, coldestC))
      found.push({
        code: 'tricaine-food-cold',
        level: 'stop',
        params: { temperature: readingOf(coldest, 'degC'), limit },
        resolvedBy: ['warm-water', 'choose-other-agent'],
      })
    found.push({
      code: 'tricaine-food-hold',
      level: 'note',
      params: { animals, days: withdrawalDays },
      resolvedBy: ['hold-animals'],
      effects: [{ kind: 'holdUntil', days: withdrawalDays }],
    })
    return found
  },
})
