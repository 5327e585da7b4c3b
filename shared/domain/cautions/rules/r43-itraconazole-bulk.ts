import { defineRule } from '../caution-rule.ts'

/** Itraconazole that was compounded from bulk powder was mostly not found in the blood at all. */
export const itraconazoleBulk = defineRule({
  id: 'R43',
  levels: ['warning'],
  when: 'design',
  overridable: true,
  routes: ['by-mouth', 'in-feed'],
  parameters: {},
  uses: ['lot.isFromBulk'],
  findings: {
    'itraconazole-from-bulk': ['use-other-lot'],
    'itraconazole-source-unknown': ['record-lot', 'use-other-lot'],
  },
  sources: [{ source: 'bunting-2009', mark: 'V' }],
  concerns: ({ agent }) => agent === 'itraconazole',
  judge({ lot: { isFromBulk } }) {
    if (isFromBulk.state === 'unknown')
      return [
        {
          code: 'itraconazole-source-unknown',
          level: 'warning',
          params: {},
          resolvedBy: ['record-lot', 'use-other-lot'],
          unknown: ['lot.isFromBulk'],
        },
      ]
    return isFromBulk.state === 'known' && isFromBulk.value
      ? [{ code: 'itraconazole-from-bulk', level: 'warning', params: {}, resolvedBy: ['use-other-lot'] }]
      : []
  },
})
