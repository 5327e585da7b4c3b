import { defineMessages } from './define-messages.ts'

/** Short names of the days of the week; 0 is Sunday, as JavaScript counts. */
export const weekdays = defineMessages({
  d0: 'Sun',
  d1: 'Mon',
  d2: 'Tue',
  d3: 'Wed',
  d4: 'Thu',
  d5: 'Fri',
  d6: 'Sat',
})
