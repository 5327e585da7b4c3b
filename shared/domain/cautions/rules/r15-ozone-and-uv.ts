import type { AgentCode } from '../../formulary/agent.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'

const harmedByOzone: readonly AgentCode[] = [
  'chloroquine',
  'praziquantel',
  'metronidazole',
  'oxytetracycline',
  'hydrogen-peroxide',
  'potassium-permanganate',
  'chloramine-t',
  'formalin',
]
const harmedByUv: readonly AgentCode[] = [
  'chloroquine',
  'praziquantel',
  'metronidazole',
  'oxytetracycline',
  'hydrogen-peroxide',
]

/** Ozone and ultraviolet light break drugs down, and ozone on top of an oxidant is twice an oxidant. */
export const ozoneAndUv = defineRule({
  id: 'R15',
  levels: ['stop'],
  when: 'start',
  overridable: true,
  parameters: {},
  uses: ['lifeSupport.ozone', 'lifeSupport.uv'],
  findings: {
    'ozone-on': ['ozone-off'],
    'ozone-unknown': ['ozone-off'],
    'uv-on': ['uv-off'],
    'uv-unknown': ['uv-off'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ agent, lifeSupport }) =>
    (harmedByOzone.includes(agent) && lifeSupport.ozone.state !== 'not-applicable') ||
    (harmedByUv.includes(agent) && lifeSupport.uv.state !== 'not-applicable'),
  judge({ agent, lifeSupport }) {
    const found: CautionFinding[] = []
    const { ozone, uv } = lifeSupport
    if (harmedByOzone.includes(agent)) {
      if (ozone.state === 'known' && ozone.value === 'on')
        found.push({ code: 'ozone-on', level: 'stop', params: {}, resolvedBy: ['ozone-off'] })
      if (ozone.state === 'unknown')
        found.push({
          code: 'ozone-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['ozone-off'],
          unknown: ['lifeSupport.ozone'],
        })
    }
    if (harmedByUv.includes(agent)) {
      if (uv.state === 'known' && uv.value === 'on')
        found.push({ code: 'uv-on', level: 'stop', params: {}, resolvedBy: ['uv-off'] })
      if (uv.state === 'unknown')
        found.push({
          code: 'uv-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['uv-off'],
          unknown: ['lifeSupport.uv'],
        })
    }
    return found
  },
  condition: ({ agent, lifeSupport }) => ({
    ozone: Number(harmedByOzone.includes(agent) && lifeSupport.ozone.state !== 'not-applicable'),
    uv: Number(harmedByUv.includes(agent) && lifeSupport.uv.state !== 'not-applicable'),
  }),
})
