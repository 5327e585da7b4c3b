import { useState } from 'react'
import { act } from 'react'
import { describe, expect, it } from 'vitest'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import {
  answersToSend,
  noAnswers,
  openStops,
  unreadWarnings,
} from '../../../src/features/orders/answers-model.ts'
import type { Answers } from '../../../src/features/orders/answers-model.ts'
import { JudgedCautions } from '../../../src/features/orders/judged-cautions.tsx'
import { draw, drawsComponents } from '../../support/react.tsx'

drawsComponents()

const noTemperature = {
  resolvedBy: ['read-temperature'],
  unknownFacts: ['water.temperatureC'],
  subject: null,
}
const caution = (
  ruleId: string,
  level: SaidCaution['level'],
  more: Partial<SaidCaution> = {},
): SaidCaution => ({
  ruleId,
  code: `${ruleId}-found`,
  level,
  overridable: true,
  title: `Title of ${ruleId}`,
  text: `Words of ${ruleId}.`,
  resolve: ['Read the temperature now.'],
  citations: [`Source of ${ruleId} (V)`],
  secondCalculation: false,
  cause: noTemperature,
  ...more,
})
const cautions = [
  caution('R06', 'warning'),
  caution('R22', 'warning'),
  caution('R03', 'stop'),
  caution('R42', 'warning', { cause: { resolvedBy: ['test-some-first'], unknownFacts: [], subject: null } }),
]

let answers: Answers = noAnswers
function Form({ maySign = true }: { maySign?: boolean }) {
  const [given, setGiven] = useState<Answers>(noAnswers)
  answers = given
  return <JudgedCautions cautions={cautions} answers={given} onAnswers={setGiven} maySign={maySign} />
}

describe('cautions of one cause on the order form', () => {
  it('are one block under the gravest, with rule, level, words and source of each', async () => {
    const { place } = await draw(<Form />)
    const blocks = [...place.querySelectorAll('.caution')]
    expect(blocks).toHaveLength(2)
    const [block] = blocks
    expect(block?.classList.contains('caution-stop')).toBe(true)
    expect(block?.querySelector('.caution-title')?.textContent).toBe('Title of R03: one cause, 3 rules')
    const members = [...(block?.querySelectorAll('.caution-members > li') ?? [])].map((li) => li.textContent)
    expect(members.map((said) => said.slice(0, 12))).toEqual(['Stop R03: Ti', 'Warning R06:', 'Warning R22:'])
    for (const [i, id] of ['R03', 'R06', 'R22'].entries()) {
      expect(members[i]).toContain(`Words of ${id}.`)
      expect(members[i]).toContain(`Source of ${id} (V)`)
    }
  })

  it('one tick answers the warnings of the line, each as itself, and no stop', async () => {
    const { place } = await draw(<Form />)
    const ticks = [...place.querySelectorAll<HTMLInputElement>('input[type=checkbox]')]
    expect(ticks).toHaveLength(2)
    expect(ticks[0]?.getAttribute('aria-label')).toBe('I have read each of these: R06, R22: Title of R06')
    await act(async () => ticks[0]?.click())
    expect(answersToSend(cautions, answers).read.map(({ ruleId }) => ruleId)).toEqual(['R06', 'R22'])
    expect(unreadWarnings(cautions, answers).map(({ ruleId }) => ruleId)).toEqual(['R42'])
    expect(openStops(cautions, answers)).toEqual({ fixed: 0, open: 1 })
    await act(async () => ticks[0]?.click())
    expect(answersToSend(cautions, answers).read).toEqual([])
  })

  it('a stop has the field of its reason inside the line; whoever cannot sign has neither', async () => {
    const { place, again } = await draw(<Form />)
    const labels = [...place.querySelectorAll('label.field-label')].map((one) => one.textContent)
    expect(labels).toEqual(['Why R03 is overridden'])
    await again(<Form maySign={false} />)
    expect(place.querySelectorAll('textarea, input')).toHaveLength(0)
  })
})
