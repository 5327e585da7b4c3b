import { counted, defineMessages } from './define-messages.ts'

/** Words of the form of a treatment order. */
export const orderFormWords = defineMessages({
  newTitle: 'New order',
  copied: (p: { number: string }) =>
    `Begun as ${p.number}. Animals, lot, first dose, use and whatever was stated then are open: choose them anew.`,
  newSource: 'Nothing is chosen for you. Amounts are worked out by the water that is there now.',
  editSource: 'A draft. It binds nobody until it is signed.',
  amendSource: (p: { n: number }) =>
    `Amending version ${String(p.n)}, which stays in force until this one is signed.`,
  amendHint: 'What is kept here becomes the next version of the same order.',

  enclosure: 'Enclosure whose water is treated',
  animals: 'Animals treated',
  animalsFirst: 'Choose the enclosure; everybody in its connected water is then listed here.',
  allOfThem: 'All of them',
  noneThere: 'Nobody is in this water.',
  bring: 'Animals to be brought to this vessel',
  bringHint: 'They stay at home until the bath; the dose is judged by who is in the vessel then.',
  animal: (p: { accession: string; name: string }) => `${p.accession} ${p.name}`,
  animalHint: (p: { count: string; code: string }) => `${p.count}, in ${p.code}`,
  sharesHint: 'Whoever is not ticked still shares the water, and is judged by the cautions.',
  problem: 'Problem treated',
  problemHint: 'What was seen, and when',
  product: 'Drug product, into the water',
  notAsEntered: 'not what was entered',
  productText: (p: { name: string; product: string; strength: string; basis: string }) =>
    `${p.name} (${p.product}), ${p.strength} ${p.basis}`,
  notInUse: 'This product is no longer in use. Choose another.',
  lot: 'Lot',
  lotHint: 'Whoever gives the dose may take another lot; it is judged then.',
  noLot: 'Chosen at the dose',
  lotText: (p: { lot: string; expires: string; state: string }) =>
    `${p.lot}, use by ${p.expires}, ${p.state}`,
  line: 'Dose line of the formulary',
  lineHint: 'Says what range is usual. It does not fill in the target.',
  noLine: 'None named',
  lineText: (p: { use: string; range: string; basis: string; water: string }) =>
    `${p.use}: ${p.range} ${p.basis}, ${p.water}`,
  lineLongest: (p: { minutes: string }) => `at most ${p.minutes}`,
  lineSource: (p: { citation: string; mark: string }) => `${p.citation} (${p.mark})`,

  target: 'Target in the water',
  targetHint: 'For example 2 mg/L. Parts per million is not taken: it does not say of what.',
  basis: 'Target is counted',
  course: 'Course',
  timing: 'How long',
  timed: 'For a time, then out',
  indefinite: 'Left in the water',
  contact: 'Contact time',
  doses: 'Number of doses',
  interval: 'Between doses',
  startsAt: 'First dose',
  startsAtHint: (p: { zone: string }) => `Facility time, ${p.zone}`,
  setting: 'Where the water is',
  division: 'Balance or measure reads to',
  divisionHint: 'Its smallest step: the amount is rounded to it',
  use: 'Use',
  asLabelled: 'As labelled',
  extralabel: 'Extralabel',
  stopIf: 'Stop the bath if',
  stopIfHint: 'What is seen, in words that a keeper can act on',
  instructions: 'How it is given',
  drift: 'Volume may have moved by',
  driftHint: 'Since the signature. Beyond it no dose is given until a veterinarian amends.',

  stated: 'What no ledger holds',
  statedHint: 'Stated by you, and printed with the order. Left open, the rules take it as unknown.',
  waterKind: 'Kind of water',
  fresh: 'Fresh',
  brackish: 'Brackish',
  marine: 'Sea',
  oxygenIsLogged: 'Oxygen is logged continuously',
  hasBloom: 'Heavy bloom of algae',
  hasPlantsOrAlgae: 'Plants or algae on show',
  isBuffered: 'Buffered with bicarbonate',
  isAired: 'Room aired, or out of doors',
  hasBiofilter: 'Biofilter on this water',
  lights: 'Lights over the water',
  full: 'Full',
  dimmed: 'Dimmed',
  off: 'Off',
  yes: 'Yes',
  no: 'No',
  notSaid: 'Not said',
  experience: 'Earlier experience with this drug here',
  experienceHint: 'Your own declaration. It stays on record for later orders.',

  amount: 'for each dose, not signed',
  noEnclosure: 'Choose the enclosure and the product, and type the target.',
  working: 'Working out',
  old: 'What stands here is from before the last change.',
  notJudged: 'The order can’t be worked out and judged now.',
  notYetJudged: 'Conditions and cautions stand here once the product is chosen.',
  notJudgedKept: 'What you typed is here and can be kept as a draft.',
  unrounded: (p: { amount: string }) => `Unrounded: ${p.amount}`,
  waterHeading: 'Connected water now',

  designHeading: 'Cautions',
  designNote: 'judged while the order is written and at the signature',
  read: 'I have read this',
  readEach: (p: { rules: string }) => `I have read each of these: ${p.rules}`,
  overrideReasonOf: (p: { rule: string }) => `Why ${p.rule} is overridden`,
  overrideReason: 'Why it is overridden',
  overrideHint: 'Signed with the order, and printed on it.',
  overrideByVet: 'Only a veterinarian with a valid licence can override this.',
  countCautions: (p: { stops: number; warnings: number; notes: number }) =>
    [
      p.stops > 0 ? counted(p.stops, 'stop', 'stops') : '',
      p.warnings > 0 ? counted(p.warnings, 'warning', 'warnings') : '',
      p.notes > 0 ? counted(p.notes, 'note', 'notes') : '',
    ]
      .filter((part) => part !== '')
      .join(', ') || 'no caution',

  sign: 'Sign as author of this order',
  signWho: (p: { name: string; jurisdiction: string; number: string; until: string }) =>
    `${p.name}, ${p.jurisdiction}, licence ${p.number}, valid to ${p.until}.`,
  signMeaning:
    'Your name, licence, the time and “author of this order” will stand on it. It can’t be changed after.',
  password: 'Your password',
  signAct: 'Sign order',
  signing: 'Signing',
  licenceEnded: (p: { number: string; until: string }) =>
    `Licence ${p.number} ended on ${p.until}. With it nothing can be signed, confirmed or overridden.`,
  noLicence: 'No licence is recorded for you that is valid today here.',
  passwordNeeded: 'Type your password.',
  missingHeading: 'Before it can be signed',
  waitForJudgement: 'Wait until the order is worked out.',
  stopsOpen: (p: { count: number }) =>
    p.count === 1
      ? 'One stop is open: remove its cause, or give a reason.'
      : `${String(p.count)} stops are open: remove their causes, or give reasons.`,
  stopsFixed: 'A stop that can’t be overridden has fired. Remove its cause.',
  warningsUnread: (p: { count: number }) =>
    p.count === 1
      ? 'Read one more warning, and tick it.'
      : `Read ${String(p.count)} more warnings, and tick them.`,
  missing: (p: { count: number }) =>
    p.count === 1 ? 'One thing is missing, see above.' : `${String(p.count)} things are missing, see above.`,
  noAmount: 'The amount can’t be worked out yet.',
  faults: 'Change the fields that are marked first.',
  chooseEnclosure: 'Choose the enclosure first.',
  signed: (p: { number: string }) => `${p.number} is signed.`,

  keepDraft: 'Keep as draft',
  keepProposal: 'Keep as proposal',
  proposalNote: 'A veterinarian takes up your proposal and signs it.',
  kept: (p: { number: string }) => `Kept as ${p.number}.`,
  toSignature: 'Go to signature',
  toProposal: 'Go to the end',
  goBack: 'Back to the order',

  staleTitle: 'Somebody else saved this draft while you were writing',
  staleBody: 'Nothing of yours is lost, and nothing of theirs was overwritten. These parts differ:',
  staleField: 'Part',
  staleTheirs: 'Saved by the other',
  staleMine: 'Yours',
  staleNone: 'Nothing differs any more.',
  keepMine: 'Save mine over it',
  takeTheirs: 'Take theirs, drop mine',
  staleSigned: 'The order was signed or ended meanwhile. What you typed is still here.',
  nothing: 'nothing',

  mayNotWrite: 'Orders are written by veterinarians and proposed by technicians.',
  ended: 'This order has ended and can’t be amended. Write a new one.',
})
