import { defineMessages } from './define-messages.ts'

/** Words of the drawing of a curve on the bench. */
export const benchPlotWords = defineMessages({
  heading: 'How it changes',
  axis: (p: { name: string; symbol: string }) => `${p.name}, ${p.symbol}`,
  tenfold: (p: { axis: string }) => `${p.axis} (in powers of ten)`,
  label: (p: { up: string; across: string }) => `Curve: ${p.up}, against ${p.across}`,
  ends: (p: { first: string; last: string; count: number }) =>
    `${String(p.count)} points, from ${p.first} to ${p.last}.`,
  point: (p: { across: string; up: string }) => `${p.up} at ${p.across}`,
  own: (p: { point: string }) => `As typed: ${p.point}.`,
  gaps: 'Where the line is missing there is no answer.',
  ownMark: (p: { up: string }) => `as typed: ${p.up}`,
  ownRow: 'as typed',
  ownPoint: (p: { across: string }) => `as typed ${p.across}`,
  noAnswer: 'no answer',
  asTable: 'Show as a table',
})
