import { defineMessages } from './define-messages.ts'

/** Words of a person's own settings. */
export const ownSettingsWords = defineMessages({
  title: 'Your own settings',
  source: 'Yours alone. Signed records, labels and prints keep the units they were signed with.',
  light: 'Light',
  lightHint: 'Kept for you on this device. Signed prints are always in day colours.',
  units: 'Units that you read',
  unitsHint: 'Dosing weights stay metric. What was entered in another unit stays readable.',
  volume: 'Volumes',
  mass: 'Body weights',
  temperature: 'Temperatures',
  length: 'Lengths',
  keys: 'Single-letter keys',
  keysLabel: 'L, N, g, / and ? act as keys when nobody is typing',
  keysHint: 'Ctrl K always finds.',
  facilityUnit: 'As the facility',
  licences: 'Licences and registrations',
  noLicence: 'No licence is entered for you.',
  licencesHint: 'An administrator enters, corrects and ends them.',
  kept: 'Kept',
})
