import { checkOnCall } from '../notices/check-on-call.ts'
import type { OnCallRefusal } from '../notices/check-on-call.ts'
import { ok, refuse } from '../result.ts'
import type { Result } from '../result.ts'
import { itemsOf, tidyList } from './list-items.ts'
import type { SettingDefinition } from './settings.ts'

export type SettingRefusal =
  | 'empty'
  | 'unknown-zone'
  | 'not-a-choice'
  | 'not-a-number'
  | 'out-of-range'
  | 'no-running-number'
  | 'running-number-runs-on'
  | 'number-form-characters'
  | 'number-form-too-long'
  | OnCallRefusal

function isZone(text: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: text })
    return true
  } catch {
    return false
  }
}

const longestForm = 24

/**
 * Whether numbers made by a form can be told apart, written on a label and typed again. A digit beside the running number
 * would make two different numbers read alike: `A1{0}` and `A{00}` both give A12.
 */
function checkNumberForm(form: string): Result<string, SettingRefusal> {
  if (form === '') return refuse('empty', 'value')
  if (form.split(/\{0+\}/).length !== 2) return refuse('no-running-number', 'value')
  const [before = '', after = ''] = form.split(/\{0+\}/)
  // what is typed into a search or an address, and printed in any face
  if (!/^[A-Za-z0-9./ -]*$/.test(before + after)) return refuse('number-form-characters', 'value')
  if (/\d$/.test(before) || /^\d/.test(after)) return refuse('running-number-runs-on', 'value')
  return form.length <= longestForm ? ok(form) : refuse('number-form-too-long', 'value')
}

/**
 * Whether a text can be the value of a setting.
 *
 * @param text as typed; a list is separated by commas and may be empty
 * @returns the tidied value
 * @refuses a SettingRefusal, with what is wrong and, of a list, which entry
 */
export function checkSetting(definition: SettingDefinition, text: string): Result<string, SettingRefusal> {
  const value = text.trim()
  switch (definition.kind) {
    case 'list':
      return ok(tidyList(value))
    case 'on-call': {
      const list = tidyList(value)
      return checkOnCall(itemsOf(list)) ?? ok(list)
    }
    case 'number-form':
      return checkNumberForm(value)
    case 'text':
      return value === '' && !definition.mayBeEmpty ? refuse('empty', 'value') : ok(value)
    case 'zone':
      return isZone(value) ? ok(value) : refuse('unknown-zone', 'value')
    case 'choice':
      return definition.choices?.includes(value) ? ok(value) : refuse('not-a-choice', 'value')
    case 'number': {
      if (!/^-?\d+(\.\d+)?$/.test(value)) return refuse('not-a-number', 'value')
      const number = Number(value)
      const low = definition.min ?? -Infinity
      const high = definition.max ?? Infinity
      return number >= low && number <= high
        ? ok(value)
        : refuse('out-of-range', 'value', { min: String(low), max: String(high) })
    }
  }
}
