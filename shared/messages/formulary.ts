import type { AgentCode } from '../domain/formulary/agent.ts'
import type { DoseUse, WaterKind } from '../domain/formulary/dose-line.ts'
import type { ConcentrationBasis } from '../domain/units/basis.ts'
import { defineMessages } from './define-messages.ts'

/** Established names, whole and in lower case; never an abbreviation. */
export const agentNames = defineMessages({
  formalin: 'formaldehyde solution 37 % (formalin)',
  'copper-sulfate': 'copper sulfate pentahydrate',
  'chelated-copper': 'chelated copper',
  chloroquine: 'chloroquine diphosphate',
  praziquantel: 'praziquantel',
  'hydrogen-peroxide': 'hydrogen peroxide',
  'chloramine-t': 'chloramine-T trihydrate',
  tricaine: 'tricaine methanesulfonate',
  'sodium-chloride': 'sodium chloride',
  'potassium-permanganate': 'potassium permanganate',
  'methylene-blue': 'methylene blue',
  metronidazole: 'metronidazole',
  oxytetracycline: 'oxytetracycline hydrochloride',
  fenbendazole: 'fenbendazole',
  enrofloxacin: 'enrofloxacin',
  florfenicol: 'florfenicol',
  ceftazidime: 'ceftazidime',
  itraconazole: 'itraconazole',
  voriconazole: 'voriconazole',
  butorphanol: 'butorphanol',
  ketamine: 'ketamine',
  meloxicam: 'meloxicam',
  ketoprofen: 'ketoprofen',
  dexamethasone: 'dexamethasone',
} satisfies Record<AgentCode, string>)

export const doseUses = defineMessages({
  'ectoparasites-bath': 'external parasites, bath',
  'ectoparasites-indefinite': 'external parasites, left in the water',
  'ectoparasites-marine-course': 'external parasites, course in sea water',
  'ectoparasites-fresh-single': 'external parasites, single dose in fresh water',
  'flukes-prolonged': 'monogeneans, left in the water',
  'flukes-short': 'monogeneans, 48 h',
  'external-bacteria': 'external bacteria, bath',
  'salt-bath': 'salt bath for hours',
  'salt-dip': 'salt dip',
  'salt-prolonged': 'salt, left in the water',
  sedation: 'sedation and anaesthesia',
  'protozoa-course': 'protozoa, course in sea water',
  'bacteria-injection': 'bacteria, by injection',
  'bacteria-by-mouth': 'bacteria, by mouth',
  'worms-by-mouth': 'worms and flukes, by mouth',
  'fungi-by-mouth': 'fungi in penguins, by mouth',
  'pain-injection': 'pain, by injection',
  'inflammation-injection': 'shock and trauma, by injection',
} satisfies Record<DoseUse, string>)

export const waterKinds = defineMessages({
  fresh: 'fresh water',
  marine: 'sea water',
  both: 'fresh and sea water',
} satisfies Record<WaterKind, string>)

/** What a concentration is a concentration of, as it stands beside the figure. */
export const basisNames = defineMessages({
  active: 'as active drug',
  product: 'as product',
  salt: 'as the salt',
  base: 'as the base',
  free: 'as free ion',
  total: 'free and bound together',
} satisfies Record<ConcentrationBasis, string>)

/** Why a lot is not put back into use, or not used. */
export const lotWords = defineMessages({
  ownReturn: 'You took this lot out of use. Another person, or a veterinarian, puts it back.',
  recalledReturn: 'A recalled lot is put back into use by a veterinarian only.',
  unknown: 'There is no such lot. Choose one from the list, or leave it as not known.',
  otherProduct: (p: { lot: string; product: string }) =>
    `Lot ${p.lot} is of another product (${p.product}). Choose a lot of the product that is ordered.`,
})
