import type { QuantityRefusal } from '../domain/units/number-refusal.ts'
import type { VolumeRefusal } from '../domain/water/volume-refusal.ts'
import { defineMessages } from './define-messages.ts'
import type { RefusalWords } from './number-refusals.ts'

/** What to do when a volume of water cannot be worked out. */
export const volumeRefusals = defineMessages({
  'deeper-than-shape': (p) =>
    `${p.What} is more than this shape can have. Check the depth and the other lengths.`,
  'narrower-than-side': () =>
    'The width in the middle has to be more than the width at the side of a bow front.',
  'axes-swapped': () => 'The short axis is longer than the long one. Swap the two.',
  'sides-not-whole': (p) =>
    `Type the number of sides as a whole number from 3 to ${p.said('most')}. ` +
    'Across flats can be measured only with an even number of sides.',
  'unknown-shape': () => 'Choose the shape of the tank from the list.',
  'no-water-part': () => 'Add the tank, or the vessel, that holds the water.',
  'part-named-twice': () => 'Two parts have the same name. Give each tank, sump and pipe its own.',
  'displaces-too-much': (p) =>
    `What stands in the tank can displace at most ${p.said('most')} % of it. Check the figure and its unit.`,
  'error-outside-range': () => 'Type the error of the volume as a percentage from 0 to 100.',
  'error-above-volume': () =>
    'The errors of the parts together are more than the water itself: this is no volume to dose by. Measure the parts again, more closely.',
  'meter-runs-backwards': () =>
    'The meter reading after filling has to be larger than the one before. Check both, or swap them.',
  'salinity-did-not-rise': () =>
    'The salinity has to rise for a salt dilution to say anything. Type the rise in grams per litre.',
  'changed-more-than-volume': () =>
    'More water was changed than there is. Check both volumes, or record the exchange as a flow.',
  'fraction-outside-range': () => 'Type the share of water changed as a fraction from 0 to 1.',
  'changes-not-whole': () => 'Type the number of changes as a whole number.',
} satisfies Record<Exclude<VolumeRefusal, QuantityRefusal>, (p: RefusalWords) => string>)
