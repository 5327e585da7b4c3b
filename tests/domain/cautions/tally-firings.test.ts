import { describe, expect, it } from 'vitest'
import { tallyFirings } from '../../../shared/domain/cautions/tally-firings.ts'

const fired = (ruleId: string, ...reasons: (string | null)[]) => reasons.map((reason) => ({ ruleId, reason }))

describe('how often rules fired', () => {
  it('counts each rule, what was overridden of it, and the reasons once each', () => {
    expect(
      tallyFirings(fired('R05', 'label of the place', null, 'other', 'label of the place', null, null)),
    ).toEqual([
      {
        ruleId: 'R05',
        fired: 6,
        overridden: 3,
        reasons: [
          { reason: 'label of the place', times: 2 },
          { reason: 'other', times: 1 },
        ],
        isOften: false,
      },
    ])
  })

  it('puts first what was overridden in more than half; exactly half is not more', () => {
    const tally = tallyFirings([
      ...fired('R26', null, null, null),
      ...fired('R03', 'read by hand', 'read by hand', null),
      ...fired('R05', 'label', null),
    ])
    expect(tally.map(({ ruleId, isOften }) => [ruleId, isOften])).toEqual([
      ['R03', true],
      ['R26', false],
      ['R05', false],
    ])
  })

  it('is empty of nothing, and counts no mark of a record', () => {
    expect(tallyFirings([])).toEqual([])
    expect(tallyFirings(fired('record', null))).toEqual([])
  })
})
