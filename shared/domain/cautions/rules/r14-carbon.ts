import { defineRule } from '../caution-rule.ts'

/** Carbon and resin take the drug out again: they are off, and known to be off, before any dose into the water. */
export const carbon = defineRule({
  id: 'R14',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: {},
  uses: ['lifeSupport.carbon'],
  findings: {
    'carbon-on': ['carbon-off'],
    'carbon-unknown': ['carbon-off'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ lifeSupport }) => lifeSupport.carbon.state !== 'not-applicable',
  judge({ lifeSupport }) {
    const fact = lifeSupport.carbon
    if (fact.state === 'not-applicable' || (fact.state === 'known' && fact.value === 'off')) return []
    if (fact.state === 'known')
      return [{ code: 'carbon-on', level: 'stop', params: {}, resolvedBy: ['carbon-off'] }]
    return [
      {
        code: 'carbon-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['carbon-off'],
        unknown: ['lifeSupport.carbon'],
      },
    ]
  },
  condition: () => ({}),
})
