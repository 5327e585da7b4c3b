import { addHours } from '../../time/instant-arithmetic.ts'
import { defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** Formaldehyde leaves the water into the air: in a room that is not aired nobody stays for a time. A pond is outdoors. */
export const reentry = defineRule({
  id: 'R40',
  levels: ['warning'],
  when: 'start',
  overridable: true,
  parameters: {
    reentryMinutes: { default: 30, unit: 'min', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: ['order.isAired', 'animals.inWater'],
  findings: {
    'room-not-aired': ['air-the-room', 'keep-people-out'],
    'room-air-unknown': ['air-the-room', 'keep-people-out'],
  },
  effects: ['reentry'],
  sources: [
    { source: 'cfr-1910-1048', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent, order }) => agent === 'formalin' && valueOf(order.setting) !== 'pond',
  judge({ at, order: { isAired }, animals }, { reentryMinutes: minutes }) {
    if (isAired.state === 'known' && isAired.value) return []
    const places = [...new Set((valueOf(animals.inWater) ?? []).map(({ enclosureCode }) => enclosureCode))]
    const found = {
      level: 'warning',
      params: { places, minutes, reentryAt: addHours(at, minutes / 60) },
      resolvedBy: ['air-the-room', 'keep-people-out'],
      effects: [{ kind: 'reentry', minutes }],
    } as const
    return isAired.state === 'known'
      ? [{ ...found, code: 'room-not-aired' }]
      : [{ ...found, code: 'room-air-unknown', unknown: ['order.isAired'] }]
  },
  condition: (_, { reentryMinutes }) => ({ minutes: reentryMinutes }),
})
