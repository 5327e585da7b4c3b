import { defineRule } from '../caution-rule.ts'

/** Methylene blue stops nitrification: there is no biofilter on the water, or it is known to be off. */
export const methyleneBlue = defineRule({
  id: 'R25',
  levels: ['stop'],
  when: 'design',
  overridable: true,
  parameters: {},
  uses: ['lifeSupport.biofilter'],
  findings: {
    'biofilter-on': ['biofilter-off', 'choose-other-water'],
    'biofilter-unknown': ['say-whether-biofilter'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ agent }) => agent === 'methylene-blue',
  judge({ lifeSupport: { biofilter } }) {
    if (biofilter.state === 'known' && biofilter.value === 'off') return []
    if (biofilter.state === 'known')
      return [
        {
          code: 'biofilter-on',
          level: 'stop',
          params: {},
          resolvedBy: ['biofilter-off', 'choose-other-water'],
        },
      ]
    return [
      {
        code: 'biofilter-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['say-whether-biofilter'],
        unknown: ['lifeSupport.biofilter'],
      },
    ]
  },
})
