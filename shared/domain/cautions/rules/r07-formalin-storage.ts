import { defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** Formalin that was kept cold or shows a white precipitate holds paraformaldehyde. Somebody has to have looked. */
export const formalinStorage = defineRule({
  id: 'R07',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: {},
  uses: ['lot.storageFault'],
  findings: {
    'formalin-storage-fault': ['use-other-lot'],
    'formalin-storage-unknown': ['look-at-the-bottle'],
  },
  sources: [{ source: 'cfr-529-1030', mark: 'V' }],
  concerns: ({ agent }) => agent === 'formalin',
  judge({ lot }) {
    const fault = valueOf(lot.storageFault)
    if (fault === true)
      return [{ code: 'formalin-storage-fault', level: 'stop', params: {}, resolvedBy: ['use-other-lot'] }]
    if (fault === false) return []
    return [
      {
        code: 'formalin-storage-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['look-at-the-bottle'],
        unknown: ['lot.storageFault'],
      },
    ]
  },
  condition: () => ({}),
})
