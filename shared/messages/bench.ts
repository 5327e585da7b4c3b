import type { BenchGroup } from '../bench/groups.ts'
import { defineMessages } from './define-messages.ts'

/** Words that every calculator of the bench shares. */
export const benchWords = defineMessages({
  the: (p: { what: string }) => `the ${p.what}`,
  noSuch: 'There is no calculator by that name. GET /api/bench lists them.',
  notChosen: (p: { what: string }) => `Choose ${p.what}.`,
  notAnOption: (p: { what: string }) => `Choose ${p.what} from the list.`,
  notWhole: (p: { what: string }) => `Type ${p.what} as a whole number.`,
  gravityAsSalinity:
    'This looks like a specific gravity. A salinity of sea water is about 35. If a salinity of 1 is meant, type 0.98 or 1.06.',
  partUnknown: (p: { what: string; part: string }) =>
    `A quantity is a value and a unit. Leave “${p.part}” out of ${p.what}, or check how it is spelled.`,
  notAsked: 'This calculator asks for nothing by that name. Leave it out, or check how it is spelled.',
  tooNearZero: (p: { what: string }) =>
    `Type ${p.what} again: it is too near to zero to reckon with. Check the figure and its unit.`,
  resultNotFinite:
    'The result is too large or too small to mean anything. Check the figures and their units.',
  notPlausible: (p: { what: string; shown: string; band: string }) =>
    `${p.what.charAt(0).toUpperCase()}${p.what.slice(1)} is ${p.shown}; ${p.band} is usual. Check the number and its unit.`,
  fractionAsPercent: (p: { what: string; shown: string }) =>
    `${p.what.charAt(0).toUpperCase()}${p.what.slice(1)} is ${p.shown}, which makes the amount a hundred times and more. If a share such as 0.98 was meant, type 98.`,
  rangeNotKnown: 'The stated errors are so large that no range can be given.',
  range: (p: { low: string; high: string }) => `${p.low} to ${p.high}`,
  disagrees:
    'The figure came out differently when it was worked out a second way, and is not shown. Tell whoever runs Pratique.',
  decisionSupport:
    'Decision support for licensed professionals. It replaces no order, label or safety data sheet; local law applies.',
})

export const benchGroupNames = defineMessages({
  dose: 'Baths and doses',
  water: 'Water chemistry',
  volume: 'Volumes and flow',
  exchange: 'Changing the water',
  body: 'Animals and feed',
  units: 'Units',
} satisfies Record<BenchGroup, string>)
