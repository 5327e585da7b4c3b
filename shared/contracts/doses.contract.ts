import { z } from 'zod'
import { doseInputWords } from '../messages/dose-refusals.ts'
import { BathSheet, DoseKey } from './bath-sheet.ts'
import { contract } from './contract.ts'
import { OrderNumber } from './order-primitives.ts'
import { EnteredQuantity, Instant, Reason, RecordId } from './primitives.ts'
import { actAddresses } from './today.addresses.ts'
import { ChosenLicence } from './signing.contract.ts'

export { BathSheet, RecordedDose, RunningBath } from './bath-sheet.ts'

const doseParams = z.strictObject({ number: OrderNumber, key: DoseKey })

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
    lot: RecordId.optional().describe(
      'Lot in the hand, by which it is judged; without it that of the first calculation, else of the order',
    ),
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

export const overrideDoseStop = contract({
  id: 'overrideDoseStop',
  method: 'post',
  path: '/orders/:number/doses/:key/overrides',
  action: 'caution.override',
  summary:
    'Override a stop for this dose alone: signed with a reason, for the finding and facts that stand now',
  params: doseParams,
  body: z.strictObject({
    licenceId: ChosenLicence,
    password: z.string().min(1).max(200).describe('The signer’s password'),
    ruleId: z.string().max(20).describe('Rule that stops'),
    code: z.string().max(80).describe('What it found'),
    finding: z.string().max(80).describe('Names the finding with its facts, as the sheet gave it'),
    lotId: RecordId.nullable().describe('Lot that the sheet was judged for'),
    reason: Reason,
  }),
  reply: { 201: BathSheet },
  problems: [
    'not-found',
    'may-not',
    'licence-not-valid',
    'licence-not-chosen',
    'password-wrong',
    'sign-in-locked',
    'broken-record',
    'bad-input',
    'dose-not-possible',
    'caution-not-fired',
    'caution-stops',
  ],
  idempotent: 'by-key',
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
  body: z
    .strictObject({
      id: RecordId,
      kind: z.enum(['recorded', 'withheld', 'refused']).describe('Given, withheld, or refused by the animal'),
      happenedAt: Instant,
      amount: EnteredQuantity.nullable().describe('What was given; null where nothing was'),
      lotId: RecordId.nullable().describe('Lot, where known'),
      note: z.string().trim().max(1000).optional().describe('In words'),
    })
    .superRefine(({ kind, amount }, context) => {
      if (kind === 'recorded' && amount === null)
        context.addIssue({ code: 'custom', path: ['amount'], message: doseInputWords.amountNeeded })
      if (kind !== 'recorded' && amount !== null)
        context.addIssue({ code: 'custom', path: ['amount'], message: doseInputWords.nothingWentIn })
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
            broken: z.boolean().describe('The order is not what was signed: nothing is given by it'),
            state: z.enum(['due', 'late', 'running', 'held']).describe('Where it stands'),
          }),
        )
        .describe('Doses'),
    }),
  },
  problems: [],
})
