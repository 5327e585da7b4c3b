import { describe, expect, it } from 'vitest'
import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { SaidCaution } from '../../../shared/contracts/order-primitives.ts'
import {
  answersToSend,
  cautionKey,
  noAnswers,
  openStops,
  unreadWarnings,
  whyNotSign,
} from '../../../src/features/orders/answers-model.ts'

const caution = (
  ruleId: string,
  level: SaidCaution['level'],
  text = 'Said.',
  overridable = true,
): SaidCaution => ({
  ruleId,
  code: 'a-code',
  level,
  overridable,
  title: ruleId,
  text,
  resolve: [],
  citations: [],
  secondCalculation: false,
})
const copper = caution('R09', 'stop')
const basis = caution('R27', 'stop', 'No basis.', false)
const unwell = caution('R41', 'warning', 'Unwell?')
const handled = caution('R41', 'warning', 'Handled?')
const all = [copper, unwell, handled, caution('R39', 'note')]

const preview = (more: Partial<OrderPreview> = {}): OrderPreview => ({
  amount: {
    unrounded: 4.3628,
    unroundedUnit: 'g',
    measured: { value: '4.36', unit: 'g' },
    text: '4.36\u00a0g',
    rangeText: null,
  },
  refusal: null,
  working: [],
  water: { enclosureCode: 'QT-3', bodies: [], volumeText: null, volumeNote: null, animals: [] },
  cautions: all,
  conditions: [],
  missing: [],
  bench: null,
  ...more,
})

describe('answers to cautions', () => {
  it('count a stop as answered only by a reason in words, and some stops never', () => {
    expect(openStops(all, noAnswers)).toEqual({ fixed: 0, open: 1 })
    expect(openStops(all, { read: [], reasons: { [cautionKey(copper)]: '  ' } })).toEqual({
      fixed: 0,
      open: 1,
    })
    expect(openStops(all, { read: [], reasons: { [cautionKey(copper)]: 'moved before' } })).toEqual({
      fixed: 0,
      open: 0,
    })
    expect(openStops([basis], { read: [], reasons: { [cautionKey(basis)]: 'I know' } })).toEqual({
      fixed: 1,
      open: 0,
    })
  })

  it('count each warning as read by its own words', () => {
    const read = { read: [cautionKey(unwell)], reasons: {} }
    expect(unreadWarnings(all, read)).toEqual([handled])
    const changed = { ...unwell, text: 'Unwell: 12 %.' }
    expect(unreadWarnings([changed], read)).toEqual([changed])
  })

  it('are sent to the caution that was read, in its words, with reasons without the space around them', () => {
    const answered = {
      read: [cautionKey(unwell)],
      reasons: { [cautionKey(copper)]: ' moved before ' },
    }
    expect(answersToSend(all, answered)).toEqual({
      read: [{ ruleId: 'R41', code: 'a-code', text: 'Unwell?' }],
      overrides: [{ ruleId: 'R09', code: 'a-code', text: 'Said.', reason: 'moved before' }],
    })
    // a reason for a stop that does not stand any more, or stands in other words, is not sent
    expect(answersToSend([unwell], answered).overrides).toEqual([])
    const changed = { ...copper, text: 'Another shrimp.' }
    expect(answersToSend([changed], answered).overrides).toEqual([])
    expect(openStops([changed], answered).open).toBe(1)
  })

  it('say what stands in the way of a signature, the first thing first', () => {
    const answered = {
      read: [cautionKey(unwell), cautionKey(handled)],
      reasons: { [cautionKey(copper)]: 'moved before' },
    }
    const why = (more: Partial<Parameters<typeof whyNotSign>[0]> = {}) =>
      whyNotSign({ preview: preview(), current: true, answers: answered, faults: 0, ...more })
    expect(why()).toBeUndefined()
    expect(why({ current: false })).toBe('Wait until the order is worked out.')
    expect(why({ preview: preview({ missing: ['Choose the product.'] }) })).toContain('One thing is missing')
    expect(why({ preview: preview({ amount: null }) })).toBe('The amount can’t be worked out yet.')
    expect(why({ preview: preview({ cautions: [basis] }) })).toContain('can’t be overridden')
    expect(why({ answers: noAnswers })).toContain('One stop is open')
    expect(why({ answers: { ...answered, read: [] } })).toBe('Read 2 more warnings, and tick them.')
    expect(why({ faults: 1 })).toContain('marked')
  })
})
