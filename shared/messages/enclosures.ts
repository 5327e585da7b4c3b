import type { EnclosureKind } from '../domain/places/enclosure-kind.ts'
import { defineMessages } from './define-messages.ts'

export const enclosureKindNames = defineMessages({
  tank: 'tank',
  pool: 'pool',
  pen: 'pen',
  tub: 'tub',
  'dip-bucket': 'dip bucket',
  'land-area': 'land area',
  transport: 'transport',
} satisfies Record<EnclosureKind, string>)

/** What happened this time and the next step, where the server refuses something about a place. */
export const enclosureDetails = defineMessages({
  onlyPropose: 'Ask a veterinarian or a technician to enter it.',
  landIsNoVessel: 'A land area holds no water; choose another kind, or leave out the treatment vessel.',
  fillMarkNeeded: 'A treatment vessel needs its fill mark, for example 60 L at the red line.',
  fillMarkOnlyOnVessel: 'Only a treatment vessel has a fill mark.',
  fillMarkField: 'the volume to the mark',
  kindKeepsWater: 'Enter a new enclosure with a code of its own; this one keeps its kind of place.',
})
