import { type CautionLevel, defineRule } from '../caution-rule.ts'

/** A running foam fractionator carries drugs out and overflows; with formalin and chloramine-T it is a stop. */
export const foamFractionator = defineRule({
  id: 'R16',
  levels: ['warning', 'stop'],
  when: 'start',
  overridable: true,
  parameters: {},
  uses: ['lifeSupport.foamFractionator'],
  findings: {
    'fractionator-on': ['fractionator-off'],
    'fractionator-unknown': ['fractionator-off'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ lifeSupport }) => lifeSupport.foamFractionator.state !== 'not-applicable',
  judge({ agent, lifeSupport }) {
    const fact = lifeSupport.foamFractionator
    const level: CautionLevel = agent === 'formalin' || agent === 'chloramine-t' ? 'stop' : 'warning'
    if (fact.state === 'not-applicable' || (fact.state === 'known' && fact.value === 'off')) return []
    if (fact.state === 'known')
      return [{ code: 'fractionator-on', level, params: {}, resolvedBy: ['fractionator-off'] }]
    return [
      {
        code: 'fractionator-unknown',
        level,
        params: {},
        resolvedBy: ['fractionator-off'],
        unknown: ['lifeSupport.foamFractionator'],
      },
    ]
  },
  condition: () => ({}),
})
