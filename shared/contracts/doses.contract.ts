import { z } from 'zod'
import { doseStates } from '../domain/orders/dose-states.ts'
import { contract } from './contract.ts'
import { OrderNumber } from './order-primitives.ts'
import { EnteredQuantity, Instant, LocalDate, May, RecordId } from './primitives.ts'
import { actAddresses } from './today.addresses.ts'

const DoseKey = z
  .string()
  .regex(/^\d{1,3}$/)
  .describe('Which planned dose of the order: 1, 2 …')
const doseParams = z.strictObject({ number: OrderNumber, key: DoseKey })

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

export const RecordedDose = z.object({
  id: RecordId,
  key: DoseKey,
  kind: z
    .enum(['given', 'recorded', 'withheld', 'refused'])
    .describe('Given under the conditions, or recorded as a fact'),
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
  stop: z
    .object({
      id: RecordId,
      at: Instant,
      beforeStart: z.boolean().describe('Its time lies before that of the dose; one of the two is wrong'),
      mayStrike: z.boolean().describe('The person who asks may strike it out now'),
      by: z.string().describe('Who stopped it'),
      cause: z.enum(['time-up', 'stopped']).describe('At its time, or before it'),
      seen: z.string().nullable().describe('What was seen'),
      rescue: z.string().nullable().describe('What was done for the animals'),
    })
    .nullable()
    .describe('The end of the bath, where it has ended'),
})
export type RecordedDose = z.infer<typeof RecordedDose>

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
  lotId: RecordId.nullable().describe('Lot that it is worked out for; null: none chosen yet'),
  targetText: z.string().describe('Signed target with its basis'),
  contactMinutes: z.number().nullable().describe('Contact time in minutes; null: left in the water'),
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
          .describe('Of a stop that was overridden at the signature on the same facts; null: it is open'),
      }),
    )
    .describe('What stops or warns now'),
  steps: z
    .array(
      z.object({
        ruleId: z.string().describe('Rule'),
        text: z.string().describe('What has to be true before the first gram'),
        level: z.enum(['stop', 'warning', 'note']).describe('How grave it is while it is not met'),
        state: z.enum(['met', 'unmet', 'unknown']).describe('How it stands now'),
        help: z.string().nullable().describe('What was found'),
        resolve: z.array(z.string()).describe('What would resolve it'),
        place: z
          .enum(['readings', 'volume', 'water', 'lot', 'second-calculation'])
          .nullable()
          .describe('Where in the application it is resolved; null where it is done at the tank'),
      }),
    )
    .describe('Conditions, judged now'),
  secondNeeded: z.boolean().describe('A second calculation by another person is needed'),
  first: Calculation.nullable().describe('First calculation for this dose'),
  second: Calculation.extend({
    agrees: z.boolean().describe('Agrees with the first'),
    alone: z.boolean().describe('Made by the same person as the first: nobody else could be reached'),
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
  may: May,
})
export type BathSheet = z.infer<typeof BathSheet>

export const getBathSheet = contract({
  id: 'getBathSheet',
  method: 'get',
  path: '/orders/:number/doses/:key',
  action: 'dose.record',
  summary: 'One planned dose, judged now: conditions, amounts, calculations, records',
  params: doseParams,
  query: z.strictObject({
    blind: z
      .enum(['yes'])
      .optional()
      .describe('Leave every amount out; whoever asks for them is no blind second person any more'),
  }),
  reply: { 200: BathSheet },
  problems: ['not-found', 'broken-record'],
})

export const printBathSheet = contract({
  id: 'printBathSheet',
  method: 'get',
  path: '/orders/:number/doses/:key/print',
  action: 'order.print',
  summary: 'The bath sheet of one dose as PDF: judged now, with lines for the pen',
  params: doseParams,
  reply: { 200: z.string().describe('PDF') },
  problems: ['not-found', 'broken-record', 'print-busy', 'print-failed'],
  produces: 'pdf',
})

export const calculateFirst = contract({
  id: 'calculateFirst',
  method: 'post',
  path: '/orders/:number/doses/:key/first-calculation',
  action: 'dose.give',
  summary: 'Work the amount out for the water as it is now and a lot in the hand',
  params: doseParams,
  body: z.strictObject({ id: RecordId, lotId: RecordId.describe('Lot in the hand') }),
  reply: { 201: BathSheet },
  problems: [
    'not-found',
    'may-not',
    'id-already-used',
    'bad-input',
    'dose-not-possible',
    'working-disagrees',
    'broken-record',
  ],
  idempotent: 'by-record-id',
})

export const calculateSecond = contract({
  id: 'calculateSecond',
  method: 'post',
  path: '/orders/:number/doses/:key/second-calculation',
  action: 'dose.calculate-second',
  summary: 'A blind second calculation by another person, from label, mark and container',
  params: doseParams,
  body: z.strictObject({
    id: RecordId,
    enclosureRead: z.string().trim().min(1).max(60).describe('Enclosure as read from its label'),
    markRead: z.string().trim().min(1).max(120).describe('Depth or fill mark as seen'),
    lotRead: z.string().trim().min(1).max(60).describe('Lot as read from the container'),
    strengthRead: EnteredQuantity.describe('Strength as read from the container'),
    amount: EnteredQuantity.describe('Amount as worked out by the second person'),
    nobodyReached: z
      .literal(true)
      .optional()
      .describe(
        'Said by whoever made the first: no other person is here or can be reached, and they repeat it themselves, minutes later; the dose is marked so',
      ),
  }),
  reply: { 201: BathSheet },
  problems: [
    'not-found',
    'id-already-used',
    'another-person-needed',
    'first-calculation-missing',
    'calculations-begin-again',
    'bad-input',
    'broken-record',
  ],
  idempotent: 'by-record-id',
})

export const giveDose = contract({
  id: 'giveDose',
  method: 'post',
  path: '/orders/:number/doses/:key/give',
  action: 'dose.give',
  summary: 'Give a dose: judged now, refused while something stands in the way',
  params: doseParams,
  body: z.strictObject({
    id: RecordId,
    lotId: RecordId.describe('Lot in the hand'),
    amount: EnteredQuantity.describe('Amount weighed or measured'),
    note: z.string().trim().max(1000).optional().describe('In words'),
  }),
  reply: { 201: BathSheet },
  problems: ['not-found', 'may-not', 'id-already-used', 'bad-input', 'dose-not-possible', 'broken-record'],
  idempotent: 'by-record-id',
})

export const recordDose = contract({
  id: 'recordDose',
  method: 'post',
  path: '/orders/:number/doses/:key/record',
  action: 'dose.record',
  summary: 'Record what happened, with its own time; never refused for its content',
  params: doseParams,
  body: z.strictObject({
    id: RecordId,
    kind: z.enum(['recorded', 'withheld', 'refused']).describe('Given, withheld, or refused by the animal'),
    happenedAt: Instant,
    amount: EnteredQuantity.nullable().describe('What was given; null where nothing was'),
    lotId: RecordId.nullable().describe('Lot, where known'),
    note: z.string().trim().max(1000).optional().describe('In words'),
  }),
  reply: { 201: BathSheet },
  problems: ['not-found', 'id-already-used', 'bad-input', 'in-the-future', 'broken-record'],
  idempotent: 'by-record-id',
})

export const stopBath = contract({
  ...actAddresses.stopBath,
  action: 'bath.stop',
  summary: 'End a bath, at its time or at once; never refused',
  params: z.strictObject({ doseId: RecordId }),
  body: z.strictObject({
    id: RecordId,
    cause: z.enum(['time-up', 'stopped']).describe('At its time, or before it'),
    happenedAt: Instant,
    seen: z.string().trim().max(1000).optional().describe('What was seen'),
    rescue: z.string().trim().max(1000).optional().describe('Flush, air, clean water'),
  }),
  reply: { 201: BathSheet },
  problems: ['not-found', 'id-already-used'],
})

export const strikeDoseRecord = contract({
  id: 'strikeDoseRecord',
  method: 'post',
  path: '/dose-records/:kind/:id/void',
  action: 'dose.strike',
  summary: 'Strike out the record of a dose or of its end; it stays readable with the reason',
  params: z.strictObject({
    kind: z.enum(['dose', 'stop']).describe('What is struck out'),
    id: RecordId,
  }),
  body: z.strictObject({ reason: z.string().trim().min(3).max(2000).describe('Why') }),
  reply: { 200: BathSheet },
  problems: ['not-found', 'already-void', 'may-not'],
  idempotent: 'by-key',
})

export const listDueDoses = contract({
  id: 'listDueDoses',
  method: 'get',
  path: '/due-doses',
  action: 'dose.record',
  summary: 'Planned doses due or late, and baths running now, in time order',
  query: z.strictObject({
    until: Instant.optional().describe('Doses planned until then; 24 h from now unless told'),
  }),
  reply: {
    200: z.object({
      rows: z
        .array(
          z.object({
            number: OrderNumber,
            key: DoseKey,
            dueAt: Instant,
            latestAt: Instant.describe('End of its window'),
            enclosureCode: z.string().describe('Enclosure'),
            drug: z.string().describe('Drug'),
            amountText: z
              .string()
              .nullable()
              .describe('Signed amount; withheld where a second person is to work it out blind'),
            state: z.enum(['due', 'late', 'running', 'held']).describe('Where it stands'),
          }),
        )
        .describe('Doses'),
    }),
  },
  problems: [],
})
