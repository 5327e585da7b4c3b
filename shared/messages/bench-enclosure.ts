import { counted, defineMessages } from './define-messages.ts'

/** "30 minutes", "4 hours": how long a reading counts. */
const span = (minutes: number) =>
  minutes < 120 ? counted(minutes, 'minute', 'minutes') : counted(Math.round(minutes / 60), 'hour', 'hours')

/** Words of the figures that a calculator takes from the water of an enclosure. */
export const benchEnclosureWords = defineMessages({
  choose: 'Figures from an enclosure',
  chooseHint: 'Its net volume and newest readings go into the fields below; each can be changed.',
  asking: 'Asking for its water…',
  take: (p: { shown: string }) => `Take ${p.shown}`,
  takeFor: (p: { shown: string; field: string }) => `Take ${p.shown} for: ${p.field}`,
  changed: (p: { says: string }) => `Changed by you. ${p.says}`,
  reading: (p: { shown: string; ago: string; by: string; code: string }) =>
    `${p.code}: ${p.shown}, read ${p.ago} by ${p.by}.`,
  readingOld: (p: { minutes: number }) => `Too old: it counts for ${span(p.minutes)}. Read the water again.`,
  readingNone: (p: { code: string; parameter: string }) =>
    `${p.code}: no reading of ${p.parameter}. Unknown.`,
  readingBelow: 'The true value lies below that, so nothing was filled in: type the figure you mean.',
  readingUnit: 'It is in a unit that this field does not take.',
  volume: (p: { code: string; shown: string; ago: string; by: string; covers: string; method: string }) =>
    `${p.code}: ${p.shown} (${p.method}), found ${p.ago} by ${p.by} and confirmed; covers ${p.covers}.`,
  volumeOld: (p: { months: number }) =>
    `Too old: it counts for ${counted(p.months, 'month', 'months')}. Measure the volume again.`,
  volumeNone: (p: { code: string; why: string }) => `${p.code}: no volume to dose by. ${p.why}`,
  noWater: 'It has no water.',
  error: (p: { code: string; shown: string }) => `${p.code}: ${p.shown}, of the same determination.`,
  errorNone: (p: { code: string }) => `${p.code}: the error of the volume is not known.`,
})
