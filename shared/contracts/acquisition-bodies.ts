import { z } from 'zod'
import { animalForms, birthKinds, identifierKinds, lifeStages, sexes } from '../domain/animals/description.ts'
import { sourceCodes } from '../domain/register/permit-kinds.ts'
import { acquisitionKinds, dispositionKinds } from '../domain/register/transaction-kinds.ts'
import { NewCounterparty } from './counterparties.contract.ts'
import { Instant, LocalDate, noneTwice, PartialDate, RecordId } from './primitives.ts'
import { AnimalCount, optionalWords, Stage, TimeOfDay, words } from './register-primitives.ts'

const Estimate = z
  .strictObject({
    low: z.int().min(0).describe('At least so many'),
    high: z.int().min(1).describe('At most so many'),
  })
  .describe('The number is an estimate and lies between these')

const PlaceGiven = z
  .strictObject({
    locality: optionalWords(500, 'Where it was collected, found or released'),
    on: PartialDate.nullish().describe('When it was collected, where that differs'),
    method: optionalWords(200, 'How it was collected'),
    latitude: z.number().min(-90).max(90).nullish().describe('Decimal degrees, WGS 84'),
    longitude: z.number().min(-180).max(180).nullish().describe('Decimal degrees, WGS 84'),
    uncertaintyMetres: z.number().positive().max(1e7).nullish().describe('Radius of uncertainty in metres'),
  })
  .describe('Where the animals were collected, found or released')

const TransportGiven = z
  .strictObject({
    carrier: optionalWords(200, 'Who carried them'),
    waybill: optionalWords(100, 'Number of the waybill'),
    boxCount: z.int().min(1).max(10_000).nullish().describe('Number of boxes'),
    sealedAt: Instant.nullish().describe('When the boxes were sealed'),
    openedAt: Instant.nullish().describe('When they were opened'),
    note: optionalWords(2000, 'Water, temperature, packing'),
  })
  .describe('How the animals travelled')

const shared = {
  id: RecordId,
  stage: Stage,
  on: PartialDate,
  time: TimeOfDay.nullish().describe('Local time of day, where the date is exact and the time is known'),
  counterpartyId: RecordId.nullish().describe('The other party'),
  newCounterparty: NewCounterparty.nullish().describe('The other party, entered with the transaction'),
  reference: optionalWords(120, 'Number on the other party’s paper: invoice, agreement, transfer form'),
  place: PlaceGiven.nullish().describe('Where the animals were collected, found or released'),
  transport: TransportGiven.nullish().describe('How the animals travelled'),
  loanDueOn: LocalDate.nullish().describe('Last day of a loan'),
  note: optionalWords(4000, 'Note'),
  permitUses: noneTwice(
    z
      .array(
        z
          .strictObject({
            id: RecordId,
            permitId: RecordId.describe('The permit'),
            lineId: RecordId.describe('The line it is used for'),
            quantity: AnimalCount.describe('Whole animals taken under it'),
          })
          .describe('A use of a permit'),
      )
      .max(100),
    ['permitId', 'lineId'],
  ).describe('What is taken under which permit'),
}

const NewAnimal = z
  .strictObject({
    record: z.literal('new').describe('An animal or group new to the collection'),
    id: RecordId.describe('Id of the line'),
    animalId: RecordId.describe('Id of the new animal or group'),
    taxonId: RecordId.describe('Its taxon'),
    form: z.enum(animalForms).describe('An individual, or a group managed as one'),
    name: optionalWords(100, 'House name'),
    sex: z.enum(sexes).describe('Sex'),
    lifeStage: z.enum(lifeStages).describe('Stage of life'),
    birthKind: z.enum(birthKinds).nullish().describe('How it came into being'),
    birthDate: PartialDate.nullish().describe('When'),
    birthApproximate: z.boolean().optional().describe('The date is an estimate'),
    count: AnimalCount.describe('Animals alive on arrival; 1 for an individual'),
    estimate: Estimate.nullish().describe('Set where the number is an estimate'),
    enclosureId: RecordId.describe('Enclosure they go into'),
    deadOnArrival: z.int().min(0).max(1_000_000).nullish().describe('Dead in the boxes, never accessioned'),
    identifiers: noneTwice(
      z
        .array(
          z
            .strictObject({
              id: RecordId,
              kind: z.enum(identifierKinds).describe('Kind of mark'),
              value: words(100).describe('The mark as read'),
              place: words(100).optional().describe('Where on the animal'),
            })
            .describe('A mark it came with or was given'),
        )
        .max(10),
    )
      .optional()
      .describe('Marks it came with or was given'),
    theirNumber: optionalWords(100, 'Number it had with the other party'),
    sourceCode: z.enum(sourceCodes).nullish().describe('Letter of the source'),
  })
  .describe('A new animal or group')

const AddedToGroup = z
  .strictObject({
    record: z.literal('existing').describe('Added to a group that is already here'),
    id: RecordId.describe('Id of the line'),
    animalId: RecordId.describe('The group'),
    count: AnimalCount.describe('Animals added, alive'),
    deadOnArrival: z.int().min(0).max(1_000_000).nullish().describe('Dead in the boxes, never accessioned'),
    sourceCode: z.enum(sourceCodes).nullish().describe('Letter of the source'),
  })
  .describe('Animals added to a group')

/** Animals come: the form of the registrar. */
export const NewAcquisition = z.strictObject({
  ...shared,
  kind: z.enum(acquisitionKinds).describe('How they came'),
  lines: noneTwice(
    z
      .array(z.discriminatedUnion('record', [NewAnimal, AddedToGroup]))
      .min(1, 'Name at least one animal or group')
      .max(50),
  ).describe('The animals and groups'),
})
export type NewAcquisition = z.infer<typeof NewAcquisition>

/** Animals leave: the form of the registrar. */
export const NewDisposition = z.strictObject({
  ...shared,
  kind: z.enum(dispositionKinds).describe('How they left'),
  lines: noneTwice(
    z
      .array(
        z
          .strictObject({
            id: RecordId.describe('Id of the line'),
            animalId: RecordId.describe('The animal or group'),
            count: AnimalCount.describe('Animals that left; 1 for an individual'),
          })
          .describe('Animals that left'),
      )
      .min(1, 'Name at least one animal or group')
      .max(50),
  ).describe('The animals and groups'),
})
export type NewDisposition = z.infer<typeof NewDisposition>
