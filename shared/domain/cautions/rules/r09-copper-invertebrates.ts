import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'
import { isInvertebrate, namesOf } from '../inhabitants.ts'

/** Copper kills most invertebrates and many sharks and rays, wherever in the connected water they are. */
export const copperInvertebrates = defineRule({
  id: 'R09',
  levels: ['stop'],
  when: 'both',
  overridable: true,
  parameters: {},
  uses: ['animals.inWater'],
  findings: {
    'inhabitants-unknown': ['record-inhabitants'],
    'copper-invertebrates': ['move-animals', 'part-the-water', 'choose-other-agent'],
    'copper-elasmobranchs': ['move-animals', 'part-the-water', 'choose-other-agent'],
  },
  sources: [{ source: 'ufifas-fa165', mark: 'V2' }],
  concerns: ({ agent }) => agent === 'copper-sulfate' || agent === 'chelated-copper',
  judge({ animals }) {
    const inWater = valueOf(animals.inWater)
    if (inWater === null)
      return [
        {
          code: 'inhabitants-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['record-inhabitants'],
          unknown: ['animals.inWater'],
        },
      ]
    const found: CautionFinding[] = []
    const base = {
      level: 'stop',
      resolvedBy: ['move-animals', 'part-the-water', 'choose-other-agent'],
    } as const
    const invertebrates = inWater.filter(isInvertebrate)
    const elasmobranchs = inWater.filter(({ taxonGroup }) => taxonGroup === 'elasmobranch')
    if (invertebrates.length > 0)
      found.push({ ...base, code: 'copper-invertebrates', params: { animals: namesOf(invertebrates) } })
    if (elasmobranchs.length > 0)
      found.push({ ...base, code: 'copper-elasmobranchs', params: { animals: namesOf(elasmobranchs) } })
    return found
  },
})
