import type { NewCounterparty } from '../../shared/contracts/counterparties.contract.ts'
import type { CountKind } from '../../shared/domain/ledger/count-entry.ts'
import type { DocumentKind } from '../../shared/domain/register/document-kinds.ts'
import type { PermitKind, PurposeCode, SourceCode } from '../../shared/domain/register/permit-kinds.ts'

/** The other parties of the practice scenario; all invented. */
export const demoParties = {
  cooperative: {
    name: 'Kelp Coast Collectors’ Cooperative',
    kind: 'collector',
    address: '3 Slip Road, Outer Norrell',
    registration: 'COL-118',
    email: 'boats@kelp-coast.example',
  },
  wholesaler: {
    name: 'Lowmarsh Tropical Wholesale',
    kind: 'dealer',
    address: '41 Ferry Yard, Lowmarsh',
    registration: 'LW-2207',
    email: 'orders@lowmarsh.example',
    telephone: '+1 555 0142',
  },
  riverCentre: {
    name: 'Ardmuir River Centre',
    kind: 'institution',
    address: 'Weir Lane, Ardmuir',
    email: 'registrar@ardmuir.example',
  },
  seaMuseum: {
    name: 'Veldmark Sea Museum',
    kind: 'institution',
    address: '1 Dam Square, Veldmark',
    email: 'registrar@veldmark.example',
  },
  amphibianArk: {
    name: 'Grenholt Amphibian Ark',
    kind: 'institution',
    address: 'Old Mill, Grenholt',
    email: 'ark@grenholt.example',
  },
  rayNursery: {
    name: 'Tidewell Ray Nursery',
    kind: 'institution',
    address: 'South Basin, Tidewell',
    email: 'nursery@tidewell.example',
  },
  birdRescue: {
    name: 'Gullwatch Shore Bird Rescue',
    kind: 'institution',
    address: 'Point Road 9, Gullwatch',
    telephone: '+1 555 0177',
  },
  fisheries: {
    name: 'Norrell Sound Fisheries Office',
    kind: 'authority',
    address: 'Harbour Office, Norrell',
  },
  school: { name: 'Sandbar Aquarium School', kind: 'institution', address: '12 Shore Street, Sandbar' },
} as const satisfies Record<string, Omit<NewCounterparty, 'id'>>

export type DemoParty = keyof typeof demoParties

interface DemoPermit {
  permitNumber: string
  authority: string
  kind: PermitKind
  /** First and last day of validity, in days before the day of loading; negative ones lie ahead. */
  fromDaysAgo: number
  untilDaysAgo: number
  quantityAllowed?: number
  /** Taxa that it is restricted to. */
  taxa?: readonly string[]
  party?: DemoParty
  purposeCode?: PurposeCode
  conditions?: string
}

/** Permits: one nearly used up, one used up, one overdrawn by two, one without a number, one that has expired. */
export const demoPermits = {
  collecting: {
    permitNumber: 'NSF-C-041',
    authority: 'Norrell Sound Fisheries Office',
    kind: 'collecting',
    fromDaysAgo: 160,
    untilDaysAgo: -40,
    quantityAllowed: 40,
    taxa: ['Gadus morhua', 'Cyclopterus lumpus'],
    party: 'fisheries',
    purposeCode: 'E',
    conditions: 'Hand net and trap only. Report the catch within 30 days.',
  },
  seahorses: {
    permitNumber: 'VM-EX-0733',
    authority: 'Wildlife Trade Desk, Veldmark',
    kind: 'cites-export',
    fromDaysAgo: 70,
    untilDaysAgo: -110,
    quantityAllowed: 14,
    taxa: ['Hippocampus erectus'],
    party: 'seaMuseum',
    purposeCode: 'Z',
  },
  sturgeon: {
    permitNumber: 'NR-519',
    authority: 'Norrell Rivers Authority',
    kind: 'authority-approval',
    fromDaysAgo: 45,
    untilDaysAgo: -320,
    quantityAllowed: 16,
    taxa: ['Acipenser fulvescens'],
    party: 'riverCentre',
    conditions: 'No release. Marks to be read on arrival.',
  },
  amphibians: {
    permitNumber: 'GH-EX-0088',
    authority: 'Wildlife Trade Desk, Grenholt',
    kind: 'cites-export',
    fromDaysAgo: 90,
    untilDaysAgo: -90,
    quantityAllowed: 20,
    taxa: ['Ambystoma mexicanum', 'Dendrobates tinctorius'],
    party: 'amphibianArk',
    purposeCode: 'Z',
  },
  reef: {
    permitNumber: 'IH-26644',
    authority: 'Border Veterinary Service',
    kind: 'import-health',
    fromDaysAgo: 26,
    untilDaysAgo: -4,
    party: 'wholesaler',
    conditions: '30 days of quarantine from arrival.',
  },
  birds: {
    permitNumber: 'NSW-H-12',
    authority: 'Norrell Sound Wildlife Service',
    kind: 'holding',
    fromDaysAgo: 740,
    untilDaysAgo: 10,
    quantityAllowed: 10,
    taxa: ['Haematopus palliatus', 'Somateria mollissima'],
  },
} as const satisfies Record<string, DemoPermit>

export type DemoPermitKey = keyof typeof demoPermits

export interface DemoPaper {
  title: string
  kind: DocumentKind
  fileName: string
  text: string
}

export interface DemoShipment {
  party?: DemoParty
  reference?: string
  permit?: DemoPermitKey
  sourceCode?: SourceCode
  locality?: string
  method?: string
  /** Hours in the box before it was opened, with who carried it. */
  travel?: { carrier: string; hours: number; boxes: number; waybill?: string; note?: string }
  deadOnArrival?: number
  loanDueInDays?: number
  papers?: readonly DemoPaper[]
}

const paper = (kind: DocumentKind, title: string, fileName: string, text: string): DemoPaper => ({
  kind,
  title,
  fileName,
  text: `${title}\n\n${text}\n\nPractice paper of an invented institution.\n`,
})

const sound = { locality: 'Norrell Sound, outer bank', sourceCode: 'W' } as const

/** How each batch came, by batch and kind of transaction; what is not named came without papers. */
export const demoShipments: Readonly<Record<string, DemoShipment>> = {
  'kelp-hall wild-collection': { ...sound, party: 'cooperative', method: 'trap and hand net' },
  'kelp-hall transfer-in': { party: 'seaMuseum', reference: 'VM-T-204', sourceCode: 'C' },
  'tide-table wild-collection': { ...sound, party: 'cooperative', method: 'by hand at low water' },
  'octopus wild-collection': { ...sound, party: 'cooperative', method: 'trap, 22 m' },
  'river transfer-in': { party: 'riverCentre', reference: 'ARC-88', sourceCode: 'C' },
  'ray-pool transfer-in': { party: 'rayNursery', reference: 'TRN-61', sourceCode: 'C' },
  'ray-pool loan-in': {
    party: 'seaMuseum',
    reference: 'VM-L-019',
    loanDueInDays: 240,
    papers: [
      paper('loan-agreement', 'Loan agreement VM-L-019', 'vm-l-019.txt', 'Two bonnetheads, for show.'),
    ],
  },
  'shore-birds rescue': { party: 'birdRescue', sourceCode: 'W' },
  'reef purchase': {
    party: 'wholesaler',
    reference: 'INV-2231',
    permit: 'reef',
    sourceCode: 'W',
    deadOnArrival: 1,
    travel: {
      carrier: 'Norrell Live Freight',
      hours: 19,
      boxes: 5,
      waybill: 'NLF-77120',
      note: 'Box 3 at 21.5 °C on opening',
    },
    papers: [
      paper('invoice', 'Invoice INV-2231', 'inv-2231.txt', '6 yellow tangs, 4 blue tangs, 12 clownfish.'),
      paper('health-certificate', 'Health certificate IH-26644', 'ih-26644.txt', 'No signs of disease seen.'),
    ],
  },
  'reef-addition purchase': {
    party: 'wholesaler',
    reference: 'INV-2258',
    sourceCode: 'W',
    travel: { carrier: 'Norrell Live Freight', hours: 17, boxes: 3, waybill: 'NLF-77391' },
    papers: [paper('invoice', 'Invoice INV-2258', 'inv-2258.txt', '3 red lionfish, late part of INV-2231.')],
  },
  'seahorses transfer-in': {
    party: 'seaMuseum',
    reference: 'VM-T-311',
    permit: 'seahorses',
    sourceCode: 'C',
    travel: { carrier: 'Veldmark Sea Museum', hours: 11, boxes: 2 },
    papers: [
      paper('permit', 'Export permit VM-EX-0733', 'vm-ex-0733.txt', '14 lined seahorses, bred in captivity.'),
      paper('transfer-form', 'Transfer form VM-T-311', 'vm-t-311.txt', 'Fed on frozen mysids twice a day.'),
    ],
  },
  'rays transfer-in': {
    party: 'rayNursery',
    reference: 'TRN-74',
    sourceCode: 'C',
    travel: { carrier: 'Tidewell Ray Nursery', hours: 6, boxes: 1, note: 'One tank, oxygen by meter' },
    papers: [
      paper('transfer-form', 'Transfer form TRN-74', 'trn-74.txt', 'Two subadult southern stingrays.'),
    ],
  },
  'sturgeon transfer-in': {
    party: 'riverCentre',
    reference: 'ARC-103',
    permit: 'sturgeon',
    sourceCode: 'C',
    travel: { carrier: 'Ardmuir River Centre', hours: 4, boxes: 1 },
    papers: [
      paper(
        'transfer-form',
        'Transfer form ARC-103',
        'arc-103.txt',
        '18 juvenile lake sturgeon, of this year.',
      ),
    ],
  },
  'amphibians transfer-in': {
    party: 'amphibianArk',
    reference: 'GA-40',
    permit: 'amphibians',
    sourceCode: 'C',
    travel: { carrier: 'Moor Couriers', hours: 14, boxes: 3, waybill: 'MC-5530' },
    papers: [
      paper('permit', 'Export permit GH-EX-0088', 'gh-ex-0088.txt', '4 axolotls, 9 dyeing poison frogs.'),
    ],
  },
  'lumpfish wild-collection': {
    ...sound,
    party: 'cooperative',
    permit: 'collecting',
    method: 'hand net',
    papers: [
      paper('collection-record', 'Catch report 14', 'catch-14.txt', '6 lumpfish, outer bank, hand net.'),
    ],
  },
  'cod wild-collection': { ...sound, party: 'cooperative', permit: 'collecting', method: 'trap' },
}

interface DemoDeparture {
  kind: Extract<CountKind, 'transfer-out' | 'sale' | 'donation-out'>
  batch: string
  scientificName: string
  count: number
  daysAgo: number
  party: DemoParty
  reference: string
  papers?: readonly DemoPaper[]
}

export const demoDepartures: readonly DemoDeparture[] = [
  {
    kind: 'transfer-out',
    batch: 'jellies',
    scientificName: 'Aurelia aurita',
    count: 30,
    daysAgo: 40,
    party: 'school',
    reference: 'HP-T-58',
    papers: [
      paper('transfer-form', 'Transfer form HP-T-58', 'hp-t-58.txt', '30 moon jellies, bells 6 to 9 cm.'),
    ],
  },
  {
    kind: 'transfer-out',
    batch: 'river',
    scientificName: 'Salvelinus fontinalis',
    count: 8,
    daysAgo: 25,
    party: 'riverCentre',
    reference: 'HP-T-61',
  },
]
