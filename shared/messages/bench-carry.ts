import { defineMessages } from './define-messages.ts'

/** Words of what is carried from the bench into an order, a volume or a reading. */
export const benchCarryWords = defineMessages({
  further: 'Take it further',
  toOrder: 'Use in an order',
  toVolume: 'Use as this water’s volume',
  toReading: (p: { parameter: string }) => `Use as a reading of ${p.parameter}`,
  whichEnclosure: 'For which enclosure',
  chooseEnclosure: 'Choose the enclosure first.',
  noNetwork:
    'There is no network, and the form cannot come without one. The figure stays here; try again once there is one.',
  nothingSaved: 'Opens the form, filled in; nothing is kept until you keep it there.',

  heading: 'From the bench',
  from: (p: { name: string; result: string }) => `From the bench: ${p.name}, ${p.result}.`,
  between: (p: { result: string; low: string; high: string }) => `${p.result} (${p.low} to ${p.high})`,
  grounds: 'What was asked on the bench, and its working',
  asked: 'Asked',
  working: 'Working',
  sources: 'Sources',
  line: (p: { what: string; text: string }) => `${p.what}: ${p.text}`,
  lineFrom: (p: { what: string; text: string; from: string }) => `${p.what}: ${p.text} (${p.from})`,
  step: (p: { what: string; formula: string; result: string }) => `${p.what}: ${p.formula} = ${p.result}`,
  askedNote: (p: { inputs: string }) => `Asked: ${p.inputs}.`,
  workingNote: (p: { lines: string }) => `Working: ${p.lines}.`,
  noteTooLong: 'The working was too long for this note.',

  inOrder: (p: { fields: string }) =>
    `Filled in from it: ${p.fields}. The order works the amount out anew, from its product and the confirmed volume; what was asked on the bench and its working are kept beside it.`,
  inOrderNothing:
    'Nothing on this form could be filled in from it. The order works the amount out by itself; what was asked on the bench and its working are kept beside it.',
  inVolume:
    'Filled in from it; the volume is worked out anew as it is recorded, and counts once another person has confirmed it. Errors that were not stated on the bench are left open.',
  inVolumeStated:
    'Filled in as a stated figure, which counts as an estimate. The working on the bench stands in the note.',
  inReading:
    'Filled in from it: worked out, not measured. It is recorded with how, as its note. Set the time to when the water was measured.',
  inReadingNot: 'Its unit is not one that this reading is entered in. Type the figure.',
})

/** Parts of an order as they are named when they come from the bench. */
export const carriedPartNames = defineMessages({
  enclosureId: 'enclosure',
  target: 'target',
  basis: 'what the target is of',
  division: 'smallest step of the balance',
})
