import { describe, expect, it } from 'vitest'
import { checkSetting } from '../../../shared/domain/settings/check-setting.ts'
import { settingKeys, settings } from '../../../shared/domain/settings/settings.ts'

const check = (key: keyof typeof settings, text: string) => {
  const result = checkSetting(settings[key], text)
  return result.ok ? result.value : [result.refusal.code, result.refusal.params?.['entry']].filter(Boolean)
}

describe('a setting', () => {
  it.each(settingKeys)('%s takes its own default', (key) => {
    expect(check(key, settings[key].default)).toBe(settings[key].default)
  })

  it('may be left out where it is an address, and not where it is the name on every document', () => {
    expect(check('facility.address', '  ')).toBe('')
    expect(check('facility.name', '  ')).toEqual(['empty'])
  })

  it.each([
    ['HP-{0000}', 'HP-{0000}'],
    [' 2026/{000} ', '2026/{000}'],
    ['{0} F', '{0} F'],
    ['HP', ['no-running-number']],
    ['', ['empty']],
    ['{0}-{0}', ['no-running-number']],
    ['HP-{}', ['no-running-number']],
    ['HP-{1}', ['no-running-number']],
    ['HP-{0', ['no-running-number']],
    // number 2 would read as number 12 of the form A{0}
    ['A1{0}', ['running-number-runs-on']],
    ['{00}7', ['running-number-runs-on']],
    ['HP–{0000}', ['number-form-characters']],
    ['HP-{0}|x', ['number-form-characters']],
    ['A very long form of a number-{0}', ['number-form-too-long']],
  ])('makes accession numbers that can be told apart from %j', (typed, taken) => {
    expect(check('numbers.accession', typed)).toEqual(taken)
  })

  it.each([
    ['Duty desk | ext. 41', 'Duty desk | ext. 41'],
    [
      ' Dr I. Marrow | +1 555 0141 | m@harrow-point.example ,, ',
      'Dr I. Marrow | +1 555 0141 | m@harrow-point.example',
    ],
    ['Dr I. Marrow | | m@harrow-point.example', 'Dr I. Marrow | | m@harrow-point.example'],
    ['', ''],
    ['Dr I. Marrow', ['on-call-way', 'Dr I. Marrow']],
    ['| 555 0141', ['on-call-name', '| 555 0141']],
    ['Duty desk | 555 0141, 555 0147 | x', ['on-call-name', '555 0147 | x']],
    ['Duty desk | m@harrow-point.example', ['on-call-phone', 'Duty desk | m@harrow-point.example']],
    ['Duty desk | 41 | at home', ['on-call-email', 'Duty desk | 41 | at home']],
    ['Desk | 41 | a@b.example | 42', ['on-call-parts', 'Desk | 41 | a@b.example | 42']],
  ])('finds in an on-call list who could not be reached: %j', (typed, taken) => {
    expect(check('notices.on-call', typed)).toEqual(taken)
  })
})
