import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'
import { isInvertebrate, namesOf } from '../inhabitants.ts'

/** Chloroquine harms algae and some invertebrates, and light breaks it down. */
export const chloroquine = defineRule({
  id: 'R17',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {},
  uses: ['animals.inWater', 'water.hasPlantsOrAlgae', 'lifeSupport.lights'],
  findings: {
    'inhabitants-unknown': ['record-inhabitants'],
    'chloroquine-invertebrates': ['move-animals', 'part-the-water', 'choose-other-agent'],
    'chloroquine-algae': ['choose-other-water'],
    'chloroquine-algae-unknown': ['record-inhabitants'],
    'chloroquine-lights': ['dim-lights'],
    'chloroquine-lights-unknown': ['dim-lights'],
  },
  sources: [{ source: 'noga-2010', mark: 'V2' }],
  concerns: ({ agent }) => agent === 'chloroquine',
  judge({ animals, water, lifeSupport }) {
    const found: CautionFinding[] = []
    const inWater = valueOf(animals.inWater)
    if (inWater === null)
      found.push({
        code: 'inhabitants-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['record-inhabitants'],
        unknown: ['animals.inWater'],
      })
    const invertebrates = inWater?.filter(isInvertebrate) ?? []
    if (invertebrates.length > 0)
      found.push({
        code: 'chloroquine-invertebrates',
        level: 'stop',
        params: { animals: namesOf(invertebrates) },
        resolvedBy: ['move-animals', 'part-the-water', 'choose-other-agent'],
      })
    const algae = water.hasPlantsOrAlgae
    if (algae.state === 'known' && algae.value)
      found.push({
        code: 'chloroquine-algae',
        level: 'warning',
        params: {},
        resolvedBy: ['choose-other-water'],
      })
    if (algae.state === 'unknown')
      found.push({
        code: 'chloroquine-algae-unknown',
        level: 'warning',
        params: {},
        resolvedBy: ['record-inhabitants'],
        unknown: ['water.hasPlantsOrAlgae'],
      })
    const lights = lifeSupport.lights
    if (lights.state === 'known' && lights.value === 'full')
      found.push({ code: 'chloroquine-lights', level: 'warning', params: {}, resolvedBy: ['dim-lights'] })
    if (lights.state === 'unknown')
      found.push({
        code: 'chloroquine-lights-unknown',
        level: 'warning',
        params: {},
        resolvedBy: ['dim-lights'],
        unknown: ['lifeSupport.lights'],
      })
    return found
  },
})
