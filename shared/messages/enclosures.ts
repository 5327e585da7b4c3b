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

/** Words of the form of an enclosure. */
export const enclosureFormWords = defineMessages({
  water: 'Water',
  newTitle: 'New enclosure',
  correctTitle: (p: { code: string }) => `Correct ${p.code}`,
  source:
    'A tank, pool, pen, tub, land area or transport. One with water gets a body of water of the same code.',
  code: 'Code',
  codeHint: 'As painted on it, for example QT-3. It never changes and is never used again.',
  codeFixed: 'A code never changes.',
  name: 'Name',
  kind: 'Kind of place',
  area: 'Part of the house',
  areaHint: 'For example Kelp hall.',
  boundary: 'Quarantine boundary',
  boundaryHint:
    'Name of the boundary it lies in; animals that are not cleared cross it only by a documented transfer.',
  airSpace: 'Air space',
  airSpaceHint: 'Name of the air that it shares with other enclosures.',
  treatmentVessel: 'A treatment vessel',
  treatmentVesselHint: 'Animals go into it for a bath and keep their home.',
  mark: 'Fill mark',
  markHint: 'Where it is, for example red line inside.',
  markVolume: 'Water to the mark',
  usGallons: 'US gal',
  description: 'Description',
  descriptionHint: 'Shape, material, what it is for.',
  enter: 'Enter the enclosure',
  save: 'Save',
  back: 'Back',
  entered: (p: { code: string }) => `${p.code} entered`,
  corrected: (p: { code: string }) => `${p.code} corrected`,
  storedNow: (p: { field: string; value: string }) => `${p.field}, stored now: ${p.value}`,
  nothing: 'nothing',
})
