import { describe, expect, it } from 'vitest'
import { findUnsafeWriting } from '../../../shared/domain/quantities/find-unsafe-writing.ts'
import { doseRefusals } from '../../../shared/messages/dose-refusals.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { volumeRefusals } from '../../../shared/messages/volume-refusals.ts'

const params = { limit: '100', unit: 'g', most: 120, minutes: 130, hours: 11, least: 12, amount: 0.377 }

describe('sentences for volumes and doses', () => {
  it.each([...Object.keys(volumeRefusals), ...Object.keys(doseRefusals)])(
    '%s says what to do, in safe writing',
    (code) => {
      if (!isNumberRefusalCode(code)) throw new Error(`no sentence for ${code}`)
      const sentence = sayNumberRefusal({ code, field: 'depth', params })
      expect(sentence).toMatch(/^[A-Z].*\.$/s)
      expect(sentence).not.toMatch(/undefined|NaN|\s\s/)
      expect(findUnsafeWriting(sentence, 'prose')).toEqual([])
    },
  )
})
