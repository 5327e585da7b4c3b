import { refuse } from '../../domain/result.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { volumeUnits } from './parts/volume-input.ts'
import {
  countedChanges,
  leftAfter,
  mostRows,
  singleChange,
  sizeOf,
  waterOf,
} from './parts/water-change-answers.ts'

const concentrationUnits = ['mg/L', 'ug/L', 'g/L'] as const
const byParts = ['changes', 'left'] as const

/** Water changes of one size: how many, what they leave, or the one that does it alone. */
export const waterChanges = defineCalculator({
  id: 'water-changes',
  group: 'exchange',
  weekly: true,
  words: defineMessages({
    name: 'Water changes',
    purpose:
      'How many water changes it takes, what a number of them leaves, or how large one single change has to be.',
    formula: 'left = new + (old − new) × (1 − share changed) ^ changes',
    'input.find': 'What to find',
    'option.find.changes': 'How many changes it takes',
    'option.find.left': 'What a number of changes leaves',
    'option.find.single': 'The single change that does it',
    'input.as': 'What is known of the water',
    'option.as.share': 'Only what share is to go or is left',
    'option.as.concentrations': 'Its concentrations',
    'input.removed': 'Share to take out',
    'input.initial': 'Concentration at the start',
    'input.target': 'Concentration wanted',
    'input.replacement': 'Concentration in the new water',
    'help.replacement': 'Clean water is 0. Tap water can hold nitrate, copper and more.',
    'input.sizeBy': 'Size of a change',
    'option.sizeBy.share': 'As a share of the water',
    'option.sizeBy.litres': 'As a volume',
    'input.share': 'Share changed each time',
    'input.changed': 'Volume changed each time',
    'input.changes': 'Number of changes',
    'input.volume': 'Net volume of the water',
    'help.volume': 'For the litres of a change; not needed for shares.',
    'input.volumeError': 'Error of the volume',
    'input.loss': 'Other loss between the changes',
    'option.loss.none': 'None that counts',
    'option.loss.half-life': 'By a half-life',
    'input.halfLife': 'Half-life in the water',
    'input.interval': 'Time from one change to the next',
    'result.changes': 'Changes',
    'result.left': 'Left after the last',
    'result.single': 'Share to change at once',
    'result.litres-each': 'Water for each change',
    'result.litres-all': 'Water in all',
    'column.change': 'Change',
    'column.before': 'Before it',
    'column.after': 'After it',
    'line.share-left': 'Share that may be left',
    'line.changes': 'Changes, the next whole number',
    'line.left': 'Left after the last',
    'line.kept': 'Kept from one change to the next',
    'line.first': 'After the first change',
    'line.single': 'Share to change at once',
    'line.litres-each': 'Water for each change',
    'line.litres-all': 'Water in all',
    'refusal.target-beyond-replacement':
      'Changes of a part never reach the new water itself or go past it. Allow a little more to be left, or change all of it.',
    'refusal.target-behind-start':
      'This new water leads the other way. Check the three concentrations, or take other water.',
    'refusal.volume-missing': 'Type the net volume of the water: without it litres are no share of it.',
    'refusal.change-too-small':
      'That is less than a millionth of the water. Check both volumes and their units.',
    'caution.lower-bound':
      'A tank has dead corners, and rock, sand and tissue give back what they took up: this is the least. Confirm it by a test.',
    'caution.chlorine':
      'Take chlorine and chloramine out of tap water before it goes in, and match temperature, pH and salinity.',
    'caution.large':
      'More than half of the water at once is a change of everything else too. Watch the animals; smaller changes over days are easier on them (from memory).',
    'caution.not-listed': (p: { most: string }) =>
      `More than ${p.most} changes are not listed one by one. Larger changes, or a flow, take less water and work.`,
  }),
  inputs: {
    find: choice(['changes', 'left', 'single']),
    as: choice(['concentrations', 'share']),
    removed: quantity({
      units: ['percent'],
      limits: { min: 0, max: 100 },
      when: { as: ['share'], find: ['changes', 'single'] },
    }),
    initial: quantity({
      units: concentrationUnits,
      limits: { min: 0, max: 1_000_000 },
      when: { as: ['concentrations'] },
    }),
    target: quantity({
      units: concentrationUnits,
      limits: { min: 0, max: 1_000_000 },
      when: { as: ['concentrations'], find: ['changes', 'single'] },
    }),
    replacement: quantity({
      units: concentrationUnits,
      limits: { min: 0, max: 1_000_000 },
      when: { as: ['concentrations'] },
    }),
    sizeBy: choice(['share', 'litres'], { when: { find: byParts } }),
    share: quantity({
      units: ['percent'],
      limits: { above: 0, min: 0.01, max: 100, plausible: { min: 1 } },
      when: { find: byParts, sizeBy: ['share'] },
    }),
    changed: quantity({
      units: volumeUnits,
      limits: { above: 0 },
      when: { find: byParts, sizeBy: ['litres'] },
    }),
    changes: quantity({
      units: ['ratio'],
      whole: true,
      limits: { min: 0, max: mostRows },
      when: { find: ['left'] },
    }),
    volume: quantity({ units: volumeUnits, limits: { above: 0 }, optional: true, netVolume: true }),
    volumeError: quantity({
      units: ['percent'],
      limits: { min: 0, max: 90 },
      optional: true,
      errorOf: 'volume',
      when: { find: byParts, sizeBy: ['litres'] },
    }),
    loss: choice(['none', 'half-life'], { optional: true, when: { find: ['left'] } }),
    halfLife: quantity({
      units: ['h', 'd', 'min'],
      limits: { above: 0, max: 60_000_000 },
      when: { find: ['left'], loss: ['half-life'] },
    }),
    interval: quantity({
      units: ['h', 'd', 'week'],
      limits: { min: 0, max: 60_000_000 },
      when: { find: ['left'], loss: ['half-life'] },
    }),
  },
  fields: {
    initialMgPerL: 'initial',
    targetMgPerL: 'target',
    replacementMgPerL: 'replacement',
    changeFraction: 'share',
    netVolume: 'volume',
    halfLifeHours: 'halfLife',
    hours: 'interval',
  },
  example: {
    find: 'changes',
    as: 'concentrations',
    initial: { value: '80', unit: 'mg/L' },
    target: { value: '20', unit: 'mg/L' },
    replacement: { value: '5', unit: 'mg/L' },
    sizeBy: 'share',
    share: { value: '30', unit: 'percent' },
    volume: { value: '2000', unit: 'L' },
  },
  sources: ['stirred-tank'],
  cautions: [
    { code: 'lower-bound', level: 'warning' },
    { code: 'chlorine', level: 'warning' },
  ],
  plot: { across: 'change', up: 'after' },
  published: [
    'remaining_after_partial_changes',
    'partial_changes_needed',
    'single_change_fraction_needed',
    'concentration_after_first_order_loss',
  ],
  compute(given) {
    const { find, changes, volume, halfLife, interval } = given
    const water = waterOf(given)
    if (find === 'single') return singleChange(water, volume)
    const size = sizeOf(given)
    if (!size.ok) return size
    if (find === 'changes') return countedChanges(water, size.value)
    const loss = halfLife && interval ? { halfLife, interval } : undefined
    return changes ? leftAfter(water, size.value, changes, loss) : refuse('blank', 'changes')
  },
})
