import type { SettingRefusal } from '../domain/settings/check-setting.ts'
import type { SettingKey } from '../domain/settings/settings.ts'
import { defineMessages } from './define-messages.ts'

export const settingNames = defineMessages({
  'facility.name': 'Name of the facility',
  'facility.address': 'Address of the facility',
  'facility.zone': 'Time zone',
  'facility.jurisdictions': 'Jurisdictions whose licences are accepted',
  'facility.paper': 'Paper',
  'facility.gallon': 'What “gal” means when no kind is stated',
  'numbers.accession': 'Form of accession numbers',
  'licences.warn-first-days': 'First warning before a licence ends, in days',
  'licences.warn-second-days': 'Second warning before a licence ends, in days',
  'licences.warn-last-days': 'Last warning before a licence ends, in days',
  'notices.on-call': 'Whom to call when something is urgent',
} satisfies Record<SettingKey, string>)

export const settingHints = defineMessages({
  'facility.name': 'Printed at the head of every document.',
  'facility.address': 'Printed on the label of what is dispensed, under the name of the veterinarian.',
  'facility.zone':
    'A zone of the IANA list, for example America/Halifax. Quarantine days are calendar dates in it.',
  'facility.jurisdictions': 'Separate several with commas, as written on the licences.',
  'facility.paper': 'A4 or Letter, for every printed document.',
  'facility.gallon': 'Refused asks each time which gallon is meant.',
  'numbers.accession': 'Zeros in braces are the running number, for example HP-{0000}.',
  'licences.warn-first-days':
    'On Today of the person and of the administrator, in the profile and beside the signature. 1 to 365 days.',
  'licences.warn-second-days': 'Said again, nearer to the end. 1 to 365 days.',
  'licences.warn-last-days': 'The last of the three. 1 to 365 days.',
  'notices.on-call':
    'Name, telephone and e-mail, with bars between them and a comma after each: Dr A. Name | 555 0100 | name@example.org. In the order in which to call.',
} satisfies Record<SettingKey, string>)

export const settingRefusals = defineMessages({
  empty: 'Type a value.',
  'unknown-zone': 'Type a zone of the IANA list, for example America/Halifax.',
  'not-a-choice': 'Choose one of the values offered.',
  'not-a-number': 'Type a number, for example 5.',
  'out-of-range': 'This number is outside what the setting allows.',
  'no-running-number': 'Write zeros in braces once, where the running number belongs, for example HP-{0000}.',
  'running-number-runs-on':
    'Put a letter or a hyphen between the running number and other digits, or two animals could get numbers that read alike.',
  'number-form-characters':
    'Use letters without accents, digits, spaces and . / - beside the running number.',
  'number-form-too-long': 'Make it at most 24 characters, so that it fits on a label.',
  'on-call-parts': 'Write each person as name | telephone | e-mail, and put a comma before the next person.',
  'on-call-name': 'Begin each entry with the name of a person or post.',
  'on-call-way': 'Give each person a telephone number, an e-mail address or both, after a bar.',
  'on-call-phone': 'The second part of an entry is a telephone number, for example +1 555 0100 or ext. 41.',
  'on-call-email': 'The third part of an entry is an e-mail address, for example name@example.org.',
} satisfies Record<SettingRefusal, string>)

export const settingDetails = defineMessages({
  newerProposed: (p: { value: string; by: string }) =>
    `A newer value was proposed since: “${p.value}”${p.by === '' ? '' : ` by ${p.by}`}. Load the settings again and confirm that one, or propose yours anew.`,
  inEntry: (p: { entry: string; says: string }) => `“${p.entry}”: ${p.says}`,
})
