import type { CautionCode, CautionParams } from '../domain/cautions/caution-code.ts'
import { counted } from './define-messages.ts'

/** Parameters as a sentence gets them: figures, names and dates written out, bare counts still numbers. */
type Said<P> = { [K in keyof P]: P[K] extends number ? number : string }
export type CautionTexts = { [Code in CautionCode]: (params: Said<CautionParams[Code]>) => string }

const hours = (count: number) => counted(Math.round(count * 100) / 100, 'hour', 'hours')

/** Where the air is meant. */
const at = (places: string) => (places === '' ? '' : ` At ${places}.`)

/** Titles of the rules on anaesthesia and on the biofilter. */
export const moreCautionTitles = {
  'tricaine-unbuffered': 'Tricaine without a buffer',
  'tricaine-buffer-unknown': 'Nobody said whether the tricaine is buffered',
  'tricaine-acid': 'The bath is too acid',
  'tricaine-ph-unknown': 'The pH of the bath is not known',
  'tricaine-ph-differs': 'The bath is not of the pH of the home water',
  'tricaine-home-ph-unknown': 'The pH of the home water is not known',
  'biofilter-on': 'Methylene blue with a biofilter on the water',
  'biofilter-unknown': 'Whether a biofilter is on the water is not known',
  'nitrogen-unknown': 'Ammonia or nitrite is not known',
  'nitrogen-before-unknown': 'Nothing to hold ammonia or nitrite against',
  'nitrogen-rising': 'Ammonia or nitrite is rising',
  'unionised-ammonia-high': 'Un-ionised ammonia is high',
  'unionised-ammonia-unknown': 'Un-ionised ammonia is not known',
  'food-or-release-unknown': 'Nobody said whether they may be eaten or set free',
  'food-or-release-not-said': 'Nobody said whether they may be eaten or set free',
  'prohibited-in-food': 'Forbidden in animals that may be eaten or set free',
  'tricaine-food-family': 'Tricaine outside the families of its label',
  'tricaine-food-cold': 'Too cold for tricaine in fish that may be eaten',
  'tricaine-food-temperature-unknown': 'Temperature for food fish is not known',
  'tricaine-food-hold': 'Not eaten and not set free for a time',
  'room-not-aired': 'Formalin in a room that is not aired',
  'room-air-unknown': 'Nobody said whether the room is aired',
  'itraconazole-from-bulk': 'Itraconazole from bulk powder',
  'itraconazole-source-unknown': 'Where this itraconazole comes from is not known',
  'animal-uses-unknown': 'Other drugs of these animals are not known',
  'anti-inflammatories-together': 'Anti-inflammatories too close together',
} satisfies Partial<Record<CautionCode, string>>

/** Their sentences. */
export const moreCautionTexts = {
  'tricaine-unbuffered': () =>
    'Tricaine is a strong acid, and the order says that the bath is not buffered. In sea water too the pH falls far.',
  'tricaine-buffer-unknown': () =>
    'Tricaine is a strong acid, and the order does not say whether the bath is buffered.',
  'tricaine-acid': (p) => `The bath reads ${p.reading}, below ${p.limit}.`,
  'tricaine-ph-unknown': (p) =>
    `The bath was not measured within ${hours(p.maxAgeHours)}. Tricaine makes it acid; below ${p.limit} nothing is put into it.`,
  'tricaine-ph-differs': (p) =>
    `The bath reads ${p.reading}, the water that the animals come from ${p.home}: more than ${p.limit} apart.`,
  'tricaine-home-ph-unknown': (p) =>
    `The water that the animals come from was not measured within ${hours(p.maxAgeHours)} on the same scale. The bath may differ from it by ${p.limit} at most.`,
  'biofilter-on': () =>
    'A biofilter runs on the connected water. Methylene blue stops it, and ammonia and nitrite rise.',
  'biofilter-unknown': () =>
    'The life support of this water has no biofilter that was recorded as on or off, and the order does not say whether there is one. Methylene blue stops it.',
  'nitrogen-unknown': (p) =>
    `The biofilter suffers under this drug, and ${p.reading} was not read within ${hours(p.maxAgeHours)}.`,
  'nitrogen-before-unknown': (p) =>
    `The biofilter suffers under this drug. There is no earlier reading of ${p.reading} to tell a rise by.`,
  'nitrogen-rising': (p) =>
    `The biofilter suffers under this drug. The newest reading of ${p.reading} is ${p.value}, more than ${p.factor} times the ${p.before} of the days before. Test every 12 hours, feed less and change water.`,
  'unionised-ammonia-high': (p) =>
    `Un-ionised ammonia nitrogen works out to ${p.value}, above ${p.limit}. Test every 12 hours, feed less and change water.`,
  'unionised-ammonia-unknown': (p) =>
    `Temperature and pH of the day or the salinity are missing, so nobody can say whether un-ionised ammonia nitrogen is at most ${p.limit}.`,
  'food-or-release-unknown': () =>
    'Whether the animals may ever be eaten or set free is not known, and it decides whether this drug may be used.',
  'food-or-release-not-said': (p) =>
    `Whether an animal may ever be eaten or set free decides whether this drug may be used. Nobody said so of: ${p.animals}.`,
  'prohibited-in-food': (p) =>
    `The law forbids this drug outside its label in animals that may be eaten, and nobody can override that. May be eaten or set free: ${p.animals}.`,
  'tricaine-food-family': (p) =>
    `The label allows tricaine in food fish of the catfish, salmon, pike and perch families alone. Not of these, or not known to be: ${p.animals}.`,
  'tricaine-food-cold': (p) =>
    `The water was at ${p.temperature} within the last hours. The label allows tricaine in food fish above ${p.limit} only.`,
  'tricaine-food-temperature-unknown': (p) =>
    `No temperature of the last hours. The label allows tricaine in food fish above ${p.limit} only.`,
  'tricaine-food-hold': (p) =>
    `For ${counted(p.days, 'day', 'days')} after the last dose these are neither eaten nor set free: ${p.animals}.`,
  'room-not-aired': (p) =>
    `The order says that the room is not aired.${at(p.places)} Given now, nobody stays there without protection until ${p.reentryAt}: ${counted(p.minutes, 'minute', 'minutes')}, or until the air is measured below the action level.`,
  'room-air-unknown': (p) =>
    `The order does not say whether the room is aired.${at(p.places)} Given now, nobody stays there without protection until ${p.reentryAt}: ${counted(p.minutes, 'minute', 'minutes')}, or until the air is measured below the action level.`,
  'itraconazole-from-bulk': () =>
    'This lot was compounded from bulk powder. Most animals that were given such had none in the blood.',
  'itraconazole-source-unknown': () =>
    'Whether this lot was compounded from bulk powder is not recorded. Most animals that were given such had none in the blood.',
  'animal-uses-unknown': () =>
    'What else these animals are given is not known, so anti-inflammatories that must not meet can’t be told apart.',
  'anti-inflammatories-together': (p) =>
    `Order ${p.orderNumber} gives ${p.agent} to these animals less than ${hours(p.limitHours)} away. Together they harm kidneys and gut.`,
} satisfies Partial<CautionTexts>
