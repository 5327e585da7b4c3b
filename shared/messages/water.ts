import type { VolumeMethod } from '../domain/connections/volume-determination.ts'
import type { LifeSupportKind } from '../domain/places/life-support-kind.ts'
import type { WaterEventKind } from '../domain/places/water-event-kind.ts'
import type { ReadingRefusal } from '../domain/readings/check-reading.ts'
import type { RangeRefusal } from '../domain/readings/check-range.ts'
import type { PhScale, ReadingParameter } from '../domain/readings/parameters.ts'
import type { QuantityRefusal } from '../domain/units/number-refusal.ts'
import { defineMessages } from './define-messages.ts'

export const parameterNames = defineMessages({
  temperature: 'temperature',
  salinity: 'salinity',
  'dissolved-oxygen': 'dissolved oxygen',
  'oxygen-saturation': 'oxygen saturation',
  ph: 'pH',
  'total-ammonia-n': 'total ammonia as N',
  'nitrite-n': 'nitrite as N',
  'nitrate-n': 'nitrate as N',
  alkalinity: 'alkalinity',
  'copper-free': 'free copper',
  'copper-total': 'total copper',
  'specific-gravity': 'specific gravity',
  conductivity: 'conductivity',
  hardness: 'hardness',
  'phosphate-p': 'phosphate as P',
  'total-chlorine': 'total chlorine',
  'oxidation-reduction': 'oxidation-reduction potential',
} satisfies Record<ReadingParameter, string>)

export const phScaleNames = defineMessages({
  nbs: 'NBS scale',
  total: 'total scale',
} satisfies Record<PhScale, string>)

export const lifeSupportNames = defineMessages({
  filter: 'filter',
  biofilter: 'biofilter',
  'foam-fractionator': 'foam fractionator',
  ozone: 'ozone',
  uv: 'UV',
  carbon: 'carbon',
  heater: 'heater',
  chiller: 'chiller',
  pump: 'pump',
  aeration: 'aeration',
} satisfies Record<LifeSupportKind, string>)

export const waterEventNames = defineMessages({
  'water-change': 'water change',
  backwash: 'backwash',
  'media-change': 'media change',
  'top-off': 'top-off',
} satisfies Record<WaterEventKind, string>)

export const volumeMethodNames = defineMessages({
  geometry: 'inside measures',
  metered: 'water meter',
  dilution: 'salt dilution',
  estimated: 'estimate',
} satisfies Record<VolumeMethod, string>)

export const volumeStates = defineMessages({
  usable: 'confirmed',
  'to-confirm': 'to be confirmed',
  'does-not-hold': 'does not hold as the valves stand',
  none: 'not determined',
  'no-water': 'no water',
})

export const readingLevels = defineMessages({
  inside: 'as wanted',
  inner: 'outside',
  outer: 'far outside',
  'no-range': 'nothing wanted',
  unknown: 'cannot be told',
})

/** Headers of lists of water, on screen and in files. */
export const waterColumns = defineMessages({
  code: 'Code',
  name: 'Name',
  area: 'Part of the house',
  connected: 'Shares water with',
  netVolume: 'Net volume (L)',
  error: 'Error (%)',
  volumeState: 'Volume',
  lastReading: 'Last measured',
  outside: 'Outside what is wanted',
  off: 'Machines off',
  happenedAt: 'Measured at',
  happenedOn: 'Facility date',
  water: 'Water',
  parameter: 'Parameter',
  value: 'Value',
  unit: 'Unit',
  scale: 'Scale',
  canonical: 'Canonical value',
  canonicalUnit: 'Canonical unit',
  judgement: 'Against what is wanted',
  instrument: 'Instrument',
  note: 'Note',
  recordedBy: 'Entered by',
  recordedAt: 'Entered at',
  voided: 'Struck through',
})

/** Refusals of readings and ranges that are not about the number itself. */
export const readingRefusals = defineMessages({
  'ph-scale-missing': 'Choose the scale of the pH: NBS for electrodes set with pH 4, 7 and 10 buffers.',
  'scale-only-for-ph': 'Only a pH has a scale.',
  'cannot-be-below': 'This instrument has no lowest mark; enter the figure it shows.',
  'range-empty': 'Type at least one limit.',
  'range-out-of-order':
    'The limits have to rise: urgent below, warned below, warned above, urgent above. Outer limits lie outside inner ones.',
} satisfies Record<Exclude<ReadingRefusal | RangeRefusal, QuantityRefusal>, string>)

/** What happened this time and the next step, where the server refuses something about water. */
export const waterDetails = defineMessages({
  amountOrShare: 'Type how much water was changed, or the share of it: one of the two.',
  amountField: 'the water changed or added',
  shareField: 'the share of the water',
  shareOnlyForChange: 'Only a water change has a share.',
  unitNotHere: 'This machine works on another water.',
  bodyNotHere: 'There is no such body of water; reload the page.',
  valveUnknown: (p: { codes: string }) =>
    `Record first whether ${p.codes} is open or shut. A volume holds for a known valve state only.`,
  alsoJoined: (p: { codes: string }) =>
    `${p.codes} was joined to this water at that time. Measure it too, or record an isolation and choose it.`,
  notJoined: (p: { codes: string }) => `${p.codes} was not joined to this water at that time. Leave it out.`,
  isolationOther: 'Choose an isolation of exactly these bodies that stood when you measured.',
  notInUseThen: 'This enclosure was not in use at that time. Check the time.',
  ownBodyMissing: 'The water of this enclosure itself has to be among the bodies.',
  errorNeeded: 'Type an error above zero for what was measured: no volume is known exactly.',
  volumeDiffers: (p: { now: string; before: string }) =>
    `This volume is ${p.now}; for the same water ${p.before} was confirmed before. Look for a slip of the decimal point or the unit. If the water has changed so much, say that you have measured it again, and confirm.`,
  confirmAnother:
    'You determined this volume. Ask a colleague who is a veterinarian or technician to confirm it.',
  onlyOwnProposal: 'Only a veterinarian or technician withdraws a volume that somebody else determined.',
  endBeforeStart: 'The isolation began later than this. Check the time.',
})
