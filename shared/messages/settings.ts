import type { SettingRefusal } from '../domain/settings/check-setting.ts'
import type { SettingKey } from '../domain/settings/settings.ts'
import { defineMessages } from './define-messages.ts'

export const settingNames = defineMessages({
  'facility.name': 'Name of the facility',
  'facility.zone': 'Time zone',
  'facility.jurisdictions': 'Jurisdictions whose licences are accepted',
  'facility.paper': 'Paper',
  'facility.gallon': 'What “gal” means when no kind is stated',
  'numbers.accession': 'Form of accession numbers',
  'notices.on-call': 'Whom to call when something is urgent',
} satisfies Record<SettingKey, string>)

export const settingHints = defineMessages({
  'facility.name': 'Printed at the head of every document.',
  'facility.zone':
    'A zone of the IANA list, for example America/Halifax. Quarantine days are calendar dates in it.',
  'facility.jurisdictions': 'Separate several with commas, as written on the licences.',
  'facility.paper': 'A4 or Letter, for every printed document.',
  'facility.gallon': 'Refused asks each time which gallon is meant.',
  'numbers.accession': 'Zeros in braces are the running number, for example HP-{0000}.',
  'notices.on-call':
    'Name, telephone and e-mail, with bars between them and a comma after each: Dr A. Name | 555 0100 | name@example.org. In the order in which to call.',
} satisfies Record<SettingKey, string>)

export const settingRefusals = defineMessages({
  empty: 'Type a value.',
  'unknown-zone': 'Type a zone of the IANA list, for example America/Halifax.',
  'not-a-choice': 'Choose one of the values offered.',
  'not-a-number': 'Type a number, for example 5.',
  'out-of-range': 'This number is outside what the setting allows.',
} satisfies Record<SettingRefusal, string>)
