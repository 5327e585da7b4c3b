import { describe, expect, it, vi } from 'vitest'
import { blankPaper, paperFaults } from '../../../src/features/documents/index.ts'
import { sayBytes } from '../../../src/lib/say-bytes.ts'
import { ReasonDialog } from '../../../src/ui/reason-dialog.tsx'
import { click, draw, drawsComponents, named, one, type } from '../../support/react.tsx'

drawsComponents()

describe('a paper to be attached', () => {
  it('asks for its file, its title and its kind', () => {
    const paper = blankPaper()
    expect(Object.keys(paperFaults(paper)).sort()).toEqual(['file', 'kind', 'title'])
    const file = new File(['x'], 'agreement.pdf')
    expect(paperFaults({ ...paper, title: 'Loan agreement', kind: 'loan-agreement', file })).toEqual({})
    expect(blankPaper().id).not.toBe(paper.id)
  })
  it('has a size that people read', () => {
    expect([0, 820, 3100, 15_000_000, 1_400_000].map(sayBytes)).toEqual([
      '0\u00a0bytes',
      '820\u00a0bytes',
      '3.1\u00a0kB',
      '15\u00a0MB',
      '1.4\u00a0MB',
    ])
  })
})

describe('a reason before the act', () => {
  const dialog = (onAct: (reason: string) => Promise<void>, onBack = vi.fn()) => (
    <ReasonDialog
      question="Void TR-0001?"
      body="It stays readable."
      label="Why"
      act="Void it"
      back="Keep it"
      onAct={onAct}
      onBack={onBack}
    />
  )
  it('is asked for, sent without the space around it, and kept when it is refused', async () => {
    const onAct = vi.fn(async (_reason: string) => {})
    const { place } = await draw(dialog(onAct))
    await click(named(place, 'Void it'))
    expect(place.textContent).toContain('Fill this in.')
    expect(onAct).not.toHaveBeenCalled()
    await type(one(place, 'textarea') as HTMLTextAreaElement, '  Wrong shipment ')
    await click(named(place, 'Void it'))
    expect(onAct).toHaveBeenCalledWith('Wrong shipment')
  })
  it('says why the server refused', async () => {
    const { place } = await draw(
      dialog(() => Promise.reject(Object.assign(new Error('x'), { says: 'More is recorded since.' }))),
    )
    await type(one(place, 'textarea') as HTMLTextAreaElement, 'Wrong shipment')
    await click(named(place, 'Void it'))
    expect(place.textContent).toContain('More is recorded since.')
    expect((one(place, 'textarea') as HTMLTextAreaElement).value).toBe('Wrong shipment')
  })
})
