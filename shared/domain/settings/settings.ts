import type { Action } from '../permissions/table.ts'
import type { SourceKey } from '../sources.ts'

/** What one setting means, what it is until somebody confirms another value, and who may confirm it. */
export interface SettingDefinition {
  default: string
  kind: 'text' | 'zone' | 'choice' | 'list' | 'number' | 'number-form' | 'on-call'
  choices?: readonly string[]
  /** A text that a facility may leave out. */
  mayBeEmpty?: true
  /** Bounds of a number, in the unit named by the key. */
  min?: number
  max?: number
  confirm: Extract<Action, 'facility.manage' | 'formulary.confirm'>
  source: SourceKey
}

/**
 * Every facility setting. A default works until a value is confirmed, and is shown as "project default, not confirmed".
 * Signed texts keep the values they were signed under.
 */
export const settings = {
  'facility.name': {
    default: 'This facility',
    kind: 'text',
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'facility.address': {
    default: '',
    kind: 'text',
    mayBeEmpty: true,
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'facility.zone': { default: 'UTC', kind: 'zone', confirm: 'facility.manage', source: 'project-default' },
  'facility.jurisdictions': {
    default: '',
    kind: 'list',
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'facility.paper': {
    default: 'A4',
    kind: 'choice',
    choices: ['A4', 'Letter'],
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'facility.gallon': {
    default: 'refused',
    kind: 'choice',
    choices: ['refused', 'us', 'imperial'],
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'numbers.accession': {
    default: 'A-{0000}',
    kind: 'number-form',
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'licences.warn-first-days': {
    default: '60',
    kind: 'number',
    min: 1,
    max: 365,
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'licences.warn-second-days': {
    default: '30',
    kind: 'number',
    min: 1,
    max: 365,
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'licences.warn-last-days': {
    default: '7',
    kind: 'number',
    min: 1,
    max: 365,
    confirm: 'facility.manage',
    source: 'project-default',
  },
  'notices.on-call': {
    default: '',
    kind: 'on-call',
    confirm: 'facility.manage',
    source: 'project-default',
  },
} as const satisfies Record<string, SettingDefinition>

export type SettingKey = keyof typeof settings
export const settingKeys = Object.keys(settings) as SettingKey[]
