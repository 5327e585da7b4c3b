import type {
  AnimalForm,
  CarcassPlace,
  CarcassState,
  DeathKind,
  IdentifierKind,
  LifeStage,
  Sex,
} from '../domain/animals/description.ts'
import type { CountKind } from '../domain/ledger/count-entry.ts'
import type { SensitivityCode, SensitivityLevel } from '../domain/taxa/sensitivity.ts'
import type { QuarantineKindName, TaxonGroup } from '../domain/taxa/taxon-group.ts'
import { defineMessages } from './define-messages.ts'

export const formNames = defineMessages({
  individual: 'individual',
  group: 'group',
} satisfies Record<AnimalForm, string>)

export const sexNames = defineMessages({
  female: 'female',
  male: 'male',
  hermaphrodite: 'hermaphrodite',
  mixed: 'both sexes',
  unknown: 'sex unknown',
} satisfies Record<Sex, string>)

export const stageNames = defineMessages({
  egg: 'egg',
  larva: 'larva',
  fry: 'fry',
  juvenile: 'juvenile',
  subadult: 'subadult',
  adult: 'adult',
  mixed: 'several stages',
  unknown: 'stage unknown',
} satisfies Record<LifeStage, string>)

export const taxonGroupNames = defineMessages({
  teleost: 'bony fish',
  salmonid: 'salmonid',
  sturgeon: 'sturgeon',
  elasmobranch: 'shark or ray',
  'other-fish': 'other fish',
  amphibian: 'amphibian',
  reptile: 'reptile',
  bird: 'bird',
  mammal: 'mammal',
  'penaeid-shrimp': 'penaeid shrimp',
  crustacean: 'crustacean',
  cephalopod: 'cephalopod',
  mollusc: 'mollusc',
  coral: 'coral',
  jelly: 'jelly',
  echinoderm: 'echinoderm',
  'other-invertebrate': 'other invertebrate',
} satisfies Record<TaxonGroup, string>)

export const quarantineKindNames = defineMessages({
  fish: 'fish',
  amphibian: 'amphibian',
  reptile: 'reptile',
  bird: 'bird',
  mammal: 'mammal',
  invertebrate: 'invertebrate',
} satisfies Record<QuarantineKindName, string>)

export const identifierKindNames = defineMessages({
  transponder: 'transponder',
  ring: 'ring',
  'flipper-tag': 'flipper tag',
  'external-tag': 'external tag',
  'visible-implant': 'visible implant',
  'fin-clip': 'fin clip',
  'natural-marks': 'natural marks',
  other: 'other mark',
} satisfies Record<IdentifierKind, string>)

export const deathKindNames = defineMessages({
  'found-dead': 'found dead',
  'died-seen': 'seen to die',
  euthanised: 'euthanised',
} satisfies Record<DeathKind, string>)

export const carcassStateNames = defineMessages({
  fresh: 'fresh',
  softening: 'softening',
  decomposed: 'decomposed',
  'not-seen': 'body not seen',
} satisfies Record<CarcassState, string>)

export const carcassPlaceNames = defineMessages({
  cooled: 'kept cool',
  frozen: 'frozen',
  fixed: 'fixed',
  discarded: 'discarded',
  'not-recovered': 'not recovered',
} satisfies Record<CarcassPlace, string>)

export const countKindNames = defineMessages({
  'wild-collection': 'wild collection',
  purchase: 'purchase',
  'donation-in': 'donation received',
  'birth-or-hatch': 'birth or hatch',
  propagation: 'propagation',
  'loan-in': 'loan received',
  'transfer-in': 'transfer received',
  rescue: 'rescue',
  confiscation: 'confiscation',
  'exchange-in': 'exchange received',
  found: 'found',
  'split-in': 'split off',
  'merge-in': 'merged in',
  'transfer-out': 'transfer away',
  'loan-out': 'lent',
  'loan-returned': 'loan returned',
  sale: 'sale',
  'donation-out': 'donation given',
  'exchange-out': 'exchange given',
  release: 'release',
  death: 'death',
  euthanasia: 'euthanasia',
  escape: 'escape',
  theft: 'theft',
  'lost-from-count': 'lost from count',
  'split-out': 'split away',
  'merge-out': 'merged away',
  'count-adjustment': 'count adjustment',
} satisfies Record<CountKind, string>)

export const sensitivityNames = defineMessages({
  copper: 'copper',
  formalin: 'formalin',
  'hydrogen-peroxide': 'hydrogen peroxide',
  chloroquine: 'chloroquine',
  praziquantel: 'praziquantel',
  'chloramine-t': 'chloramine-T',
  permanganate: 'permanganate',
  'methylene-blue': 'methylene blue',
  salt: 'salt',
  'fresh-water-dip': 'freshwater dip',
  'low-salinity': 'low salinity',
  anaesthetic: 'anaesthetics',
  handling: 'handling',
  'scaleless-skin': 'scaleless skin',
} satisfies Record<SensitivityCode, string>)

export const sensitivityLevelNames = defineMessages({
  avoid: 'avoid',
  caution: 'with care',
  tolerates: 'borne here',
  none: 'nothing known',
} satisfies Record<SensitivityLevel, string>)

/** Headers of the list of animals, on screen and in its file. */
export const animalColumns = defineMessages({
  accession: 'Accession',
  form: 'Form',
  name: 'Name',
  commonName: 'Common name',
  scientificName: 'Scientific name',
  group: 'Group',
  quarantineKind: 'Quarantine kind',
  sex: 'Sex',
  stage: 'Stage',
  enclosure: 'Enclosure',
  area: 'Area',
  since: 'There since',
  count: 'Count (ledger)',
  countBasis: 'Count basis',
  countLow: 'Count low',
  countHigh: 'Count high',
  weight: 'Newest weight, one animal (kg)',
  weighedOn: 'Weighed on',
  weightBasis: 'Weight basis',
  movement: 'Movement',
  discrepancies: 'Open discrepancies',
})

export const lockNames = defineMessages({
  none: 'free',
  boundary: 'in quarantine',
  all: 'held',
})

export const basisNames = defineMessages({
  counted: 'counted',
  estimated: 'estimated',
  measured: 'measured',
})
