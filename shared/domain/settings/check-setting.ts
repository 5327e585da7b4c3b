import { ok, refuse } from '../result.ts'
import type { Result } from '../result.ts'
import type { SettingDefinition } from './settings.ts'

export type SettingRefusal = 'empty' | 'unknown-zone' | 'not-a-choice' | 'not-a-number' | 'out-of-range'

function isZone(text: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: text })
    return true
  } catch {
    return false
  }
}

/**
 * Whether a text can be the value of a setting.
 *
 * @param text as typed; a list is separated by commas and may be empty
 * @returns the tidied value
 * @refuses empty | unknown-zone | not-a-choice | not-a-number | out-of-range
 */
export function checkSetting(definition: SettingDefinition, text: string): Result<string, SettingRefusal> {
  const value = text.trim()
  switch (definition.kind) {
    case 'list': {
      const items = value.split(',').map((item) => item.trim())
      return ok(items.filter((item) => item !== '').join(', '))
    }
    case 'text':
      return value === '' ? refuse('empty', 'value') : ok(value)
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

/** The items of a list setting. */
export function itemsOf(value: string): string[] {
  return value === '' ? [] : value.split(',').map((item) => item.trim())
}
