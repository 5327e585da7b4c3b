import type { CautionEffect, CautionRuleId } from '../domain/cautions/caution-rule.ts'
import type { OrderRoute } from '../domain/orders/order-route.ts'
import { defineMessages } from './define-messages.ts'

/** Why a rule is there, for whoever asks before confirming another value or overriding it. */
export const cautionReasonWords = defineMessages({
  R01: 'Animals in a bath breathe harder, and some drugs take oxygen out of the water. The floor is the label’s for formalin in ponds, adopted here for every bath.',
  R02: 'Formalin that stays in the water takes oxygen for a day and more: about one part of oxygen for every five of product.',
  R03: 'The label of formalin forbids it in ponds that are warm or in bloom, and with striped bass.',
  R04: 'The label names a longest contact for each stage and group of animals.',
  R05: 'The label names a highest strength for each stage and group of animals; exactly at its temperature the stricter row holds.',
  R06: 'Extension advice caps formalin in warm water, where it harms fish sooner and oxygen is scarcer.',
  R07: 'Formalin that was cold or frozen forms paraformaldehyde, which is far more poisonous.',
  R08: 'The two must never meet: the reaction can be explosive.',
  R09: 'Copper kills most invertebrates and many elasmobranchs.',
  R10: 'In soft fresh water copper kills fish at strengths that are safe in hard water.',
  R11: 'In fresh water the strength of copper that fish bear goes by the alkalinity, up to a cap.',
  R12: 'Between too little to treat and too much to survive lies a narrow margin, and copper leaves the water by itself.',
  R13: 'A reducer or an ionic product sets copper free from a chelate all at once.',
  R14: 'Carbon and resin take the drug out of the water before it has worked.',
  R15: 'Ozone and ultraviolet light break drugs down, and oxidants add up.',
  R16: 'A foam fractionator carries the drug out and may overflow.',
  R17: 'Chloroquine is poisonous to algae and some invertebrates, and light breaks it down.',
  R18: 'Tricaine is a strong acid: without a buffer the pH falls far, in sea water too, and the animals are burnt by it.',
  R19: 'The label of tricaine allows it in food fish of four families only, in water above 10 °C, and not within 21 days of harvest.',
  R22: 'The label of hydrogen peroxide excludes some species and stages; warm water makes it harsher.',
  R23: 'Chloramine-T is more poisonous in acid and soft water.',
  R24: 'In alkaline and hard water permanganate leaves its oxide on the gills, and what is given in a day adds up.',
  R25: 'Methylene blue stops the bacteria that turn ammonia into nitrate.',
  R26: 'A slip of the decimal point or of the unit shows as a figure far from the range that is used.',
  R27: 'Product, salt, base and free forms differ by factors of two to four: a bare figure is not a dose.',
  R28: 'Doses given too early add up in the animal; those given too late leave gaps.',
  R29: 'Drugs in one water add up, and some of them react with each other.',
  R30: 'Where a drug harms the biofilter, ammonia and nitrite rise within days, and harm the animals more than what was treated.',
  R31: 'A dose that rests on an old test rests on other water.',
  R32: 'An error of the volume is the same error of the dose.',
  R33: 'An error of the weight is the same error of the dose.',
  R34: 'A lot that expired, was recalled or was set aside is not what its label says.',
  R37: 'The law forbids nitroimidazoles and fluoroquinolones outside the label in animals that may be eaten. An animal that is set free may be eaten too.',
  R39: 'Another person, working from the label and the container, finds a tenfold error, the wrong water and the wrong bottle.',
  R40: 'Formaldehyde is a carcinogen and a sensitiser, and leaves the water into the air.',
  R41: 'Weak or lately handled animals bear a treatment badly.',
  R42: 'Labels and circulars ask for a trial on a few animals where a species has no experience of the drug.',
  R43: 'Of 30 samples after itraconazole from bulk powder 26 held none that could be measured.',
  R44: 'Together they harm kidneys and gut more than either does.',
  R47: 'A figure beyond every published range for the drug is a slip, and not a decision.',
  R48: 'A plan far ahead, long, or blind to earlier doses is decided for animals and water that will be others by then.',
  R49: 'A range holds for the water and the contact time that it was published for.',
  R50: 'Doses that stay in the water make a strength together that no single one of them has.',
} satisfies Record<CautionRuleId, string>)

/** The ways of treating that a rule is asked for. */
export const orderRouteWords = defineMessages({
  immersion: 'bath',
  injection: 'injection',
  'by-mouth': 'by mouth',
  'in-feed': 'in feed',
  'on-skin': 'on the skin',
} satisfies Record<OrderRoute, string>)

/** What a rule may bring besides its level. */
export const cautionEffectWords = defineMessages({
  secondCalculation: 'a second calculation by another person',
  reentry: 'a time before which nobody stays in the room without protection',
  holdUntil: 'a day before which treated animals are neither eaten nor set free',
  task: 'work to do: ammonia and nitrite tested every 12 hours, less fed, water changed',
} satisfies Record<CautionEffect['kind'], string>)
