import { z } from 'zod'
import { doseStates } from '../domain/orders/dose-states.ts'
import { OrderNumber } from './order-primitives.ts'
import { EnteredQuantity, Instant, LocalDate, May, RecordId } from './primitives.ts'
import { SignatureBlock } from './signing.contract.ts'

export const DoseKey = z
  .string()
  .regex(/^\d{1,3}$/)
  .describe('Which planned dose of the order: 1, 2 …')
const Caution = z.object({
  ruleId: z.string().describe('Rule'),
  code: z.string().describe('What it found'),
  level: z.enum(['stop', 'warning', 'note']).describe('How grave it is'),
  title: z.string().describe('In a few words'),
  text: z.string().describe('In sentences'),
  resolve: z.array(z.string()).describe('What would resolve it'),
})

const Calculation = z.object({
  by: z.string().describe('Who worked it out'),
  at: Instant,
  lotNumber: z.string().nullable().describe('Lot it was worked out for'),
  amountText: z
    .string()
    .nullable()
    .describe('The amount; withheld from the second person until the two calculations agree'),
  mine: z.boolean().describe('Made by the person who asks'),
})

const PlannedDose = z.object({
  key: DoseKey,
  dueAt: Instant.describe('When it is planned'),
  opensAt: Instant.describe('Beginning of its window'),
  latestAt: Instant.describe('End of its window'),
  state: z.enum(doseStates).describe('Where it stands'),
})

const BathStop = z.object({
  id: RecordId,
  at: Instant,
  beforeStart: z
    .boolean()
    .describe('Its time lies before that of the dose: one of the two is wrong, and it ends nothing'),
  mayStrike: z.boolean().describe('The person who asks may strike it out now'),
  by: z.string().describe('Who stopped it'),
  cause: z.enum(['time-up', 'stopped']).describe('At its time, or before it'),
  seen: z.string().nullable().describe('What was seen'),
  rescue: z.string().nullable().describe('What was done for the animals'),
})

export const RecordedDose = z.object({
  id: RecordId,
  key: DoseKey,
  kind: z
    .enum(['given', 'recorded', 'withheld', 'refused'])
    .describe('Given under the conditions, or recorded as a fact'),
  record: z
    .enum(['intact', 'broken'])
    .describe('Whether it is what was recorded; of a broken one no figure is shown'),
  amountText: z.string().nullable().describe('What was given'),
  lotNumber: z.string().nullable().describe('Lot'),
  happenedAt: Instant,
  recordedAt: Instant.describe('When it was entered'),
  by: z.string().describe('Who recorded it'),
  note: z.string().nullable().describe('In words'),
  exceptions: z.array(Caution).describe('What would have stopped or warned; for the veterinarian to review'),
  struck: z
    .object({
      reason: z.string().describe('Why it was struck out'),
      at: Instant.describe('When it was struck out'),
      by: z.string().describe('Who struck it out'),
    })
    .nullable()
    .describe('Struck out: it stays readable, and nothing rests on it; null while it stands'),
  mayStrike: z.boolean().describe('The person who asks may strike it out now'),
  twice: z.boolean().describe('Another record of the same planned dose exists'),
  stop: BathStop.nullable().describe(
    'The end of the bath, where it has ended; of several the latest. None lies before the dose',
  ),
  otherStops: z
    .array(BathStop)
    .describe('Other ends that were recorded of it; all but one are wrong, and are struck out'),
})
export type RecordedDose = z.infer<typeof RecordedDose>

/** A timed bath that went in and has no end. */
export const RunningBath = z.object({
  doseId: RecordId,
  key: DoseKey,
  startedAt: Instant,
  endsAt: Instant.nullable().describe(
    'By the contact time that was signed of the version it was given under; null where the signed text cannot be read',
  ),
  by: z.string().describe('Who recorded it'),
})
export type RunningBath = z.infer<typeof RunningBath>

/** One planned dose as the person at the tank needs it, judged now. */
export const BathSheet = z.object({
  number: OrderNumber,
  versionNo: z.int().describe('Signed version in force'),
  key: DoseKey,
  now: Instant.describe('The server’s own time: a bath is timed by it'),
  dueAt: Instant.describe('When it is planned'),
  doses: z.int().describe('Doses planned in all'),
  calendar: z.array(PlannedDose).describe('Every planned dose of the order'),
  standing: z
    .object({
      kind: z.enum(['held', 'discontinued', 'expired', 'completed']).describe('What stands in the way'),
      by: z.string().nullable().describe('Who held or ended it'),
      at: Instant.nullable().describe('When'),
      reason: z.string().nullable().describe('Why, where somebody said so'),
    })
    .nullable()
    .describe('Held, or ended; null while doses may be given'),
  state: z.enum(['due', 'running', 'done', 'held', 'ended', 'broken']).describe('Where this dose stands'),
  recordFault: SignatureBlock.shape.fault,
  record: SignatureBlock.shape.state.describe(
    'Whether the order is what was signed, whatever became of this dose',
  ),
  enclosureCode: z.string().describe('Enclosure whose water is treated'),
  enclosureName: z.string().describe('Its name'),
  drug: z.string().describe('Established name of the drug'),
  productName: z.string().describe('Product'),
  form: z.enum(['liquid', 'powder', 'crystals']).nullable().describe('Form of the product'),
  treated: z.array(z.string()).describe('The animals treated, with how many'),
  lots: z
    .array(
      z.object({
        id: RecordId,
        lotNumber: z.string().describe('Lot number'),
        state: z.string().describe('Whether it may be used'),
        expiresOn: LocalDate.describe('Last day of use'),
      }),
    )
    .describe('Lots of the product'),
  lotId: RecordId.nullable().describe('Lot that it is worked out and judged for; null: none chosen yet'),
  lotChanged: z.boolean().describe('That lot is not the one of the first calculation, which is made again'),
  targetText: z.string().describe('Signed target with its basis'),
  contactMinutes: z.number().nullable().describe('Contact time in minutes; null: left in the water'),
  reentry: z
    .object({
      place: z.string().describe('Enclosure, in words'),
      until: Instant.describe('Nobody stays there without protection before it'),
    })
    .nullable()
    .describe('Formalin went in, in a room that nobody called aired; null when nothing is waited for')
    .optional(),
  stopIf: z.string().describe('When the bath is stopped at once'),
  instructions: z.string().describe('How it is given'),
  blind: z.boolean().describe('Amounts are left out: for the person who calculates a second time'),
  signedAmountText: z.string().nullable().describe('Amount as signed'),
  amountNowText: z.string().nullable().describe('Amount by the water as it is now'),
  amountNow: EnteredQuantity.nullable().describe('The same, as digits and unit'),
  working: z
    .array(
      z.object({
        label: z.string().describe('What the line works out'),
        shown: z.string().describe('The arithmetic'),
        result: z.string().describe('The answer'),
      }),
    )
    .describe('Working by the water as it is now'),
  roundingText: z
    .string()
    .nullable()
    .describe('What the amount now is unrounded, and what the balance or measure makes of it'),
  driftPercent: z.number().nullable().describe('How far the volume has moved since the signature, percent'),
  driftWithin: z.boolean().describe('Inside what the order allows'),
  cautions: z
    .array(
      Caution.extend({
        overridden: z
          .object({
            by: z.string().describe('The veterinarian who signed the override'),
            reason: z.string().describe('Why'),
          })
          .nullable()
          .describe(
            'Of a stop that was overridden with the order, or for this dose, on the same facts; null: it is open',
          ),
        finding: z
          .string()
          .nullable()
          .describe(
            'Names an open stop that may be overridden, with its facts and the lot; null of all others',
          ),
      }),
    )
    .describe('What stops or warns now'),
  overrides: z
    .array(
      z.object({
        id: RecordId,
        title: z.string().describe('The stop in a few words'),
        text: z.string().describe('What was found, as it was signed'),
        reason: z.string().describe('Why it was overridden'),
        signature: SignatureBlock.describe('Who signed it; checked now'),
      }),
    )
    .describe('Stops that a veterinarian overrode for this dose alone'),
  steps: z
    .array(
      z.object({
        ruleId: z.string().describe('Rule'),
        text: z.string().describe('What has to be true before the first gram'),
        level: z.enum(['stop', 'warning', 'note']).describe('How grave it is while it is not met'),
        state: z.enum(['met', 'unmet', 'unknown']).describe('How it stands now'),
        help: z.string().nullable().describe('What was found by the limits that were signed'),
        changed: z
          .array(z.string())
          .describe(
            'Limits that the facility changed since the signature, and what only those in force find',
          ),
        resolve: z.array(z.string()).describe('What would resolve it'),
        place: z
          .enum(['readings', 'volume', 'water', 'animals', 'lot', 'second-calculation'])
          .nullable()
          .describe('Where in the application it is resolved; null where it is done at the tank'),
        overridden: z.boolean().describe('Every stop of its rule was answered with a signed reason'),
      }),
    )
    .describe('Conditions, judged now'),
  secondNeeded: z.boolean().describe('A second calculation by another person is needed'),
  first: Calculation.nullable().describe('First calculation for this dose'),
  second: Calculation.extend({
    agrees: z.boolean().describe('Agrees with the first'),
    alone: z.boolean().describe('Made by the same person as the first: nobody else could be reached'),
    aloneText: z.string().nullable().describe('By whom, and how long after the first; null unless it agrees'),
    differs: z
      .array(z.enum(['enclosure', 'mark', 'lot', 'strength', 'amount']))
      .describe('What does not agree with the first calculation, the order or the label'),
    markCompared: z
      .boolean()
      .describe('A depth or fill mark is on file, and the mark read was compared with it'),
    differencePercent: z
      .number()
      .nullable()
      .describe('Difference from the first, percent; withheld from the second person until they agree'),
  })
    .nullable()
    .describe('Newest second calculation for this dose'),
  secondShut: z
    .enum(['may-not', 'no-first', 'same-person', 'amount-seen', 'begin-again'])
    .nullable()
    .describe('Why the person who asks cannot calculate a second time now; null when they can'),
  repeatAt: Instant.nullable().describe(
    'From when whoever made the first may repeat it alone where nobody else can be reached; null for everybody else',
  ),
  mayStart: z.boolean().describe('Nothing stands in the way of giving it now'),
  why: z.array(z.string()).describe('What stands in the way'),
  recorded: z.array(RecordedDose).describe('Records of this dose'),
  running: z
    .array(RunningBath)
    .describe(
      'Every timed bath of the order that has no end, of this dose or another, the first to end first',
    ),
  may: May,
})
export type BathSheet = z.infer<typeof BathSheet>
