import { z } from 'zod'
import type { ClockEventBody } from '../domain/quarantine/clock-event.ts'
import type { ClockPolicy } from '../domain/quarantine/clock-policy.ts'
import { quarantineKinds } from '../domain/quarantine/quarantine-kind.ts'
import { Instant, LocalDate } from './primitives.ts'

const Id = z.string().min(1).max(120)
const Name = z.string().trim().max(200)
const Days = z.int().min(0).max(3650)
const Hours = z.number().min(0).max(87_600)
const Count = z.int().min(0).max(1_000_000)

const whoCame = {
  animalCount: Count.optional().describe('How many animals came; only for the sentence'),
  animalName: Name.optional().describe('Common name of one of them; only for the sentence'),
  heldAfter: Count.optional().describe('How many there were afterwards; only for the sentence'),
}
const treatment = {
  treatmentId: Id.describe('The same name at its start and at its end'),
  agentName: Name.describe('What was given'),
  masks: z.boolean().describe('Whether it hides what the tests look for'),
  windowDays: Days.optional().describe('Days after its end, instead of those of the policy'),
  continues: z.boolean().optional().describe('Declared to run on past clearance: it delays nothing'),
  forResultEventId: Id.optional().describe('The positive result that it treats'),
}

const Criterion = z
  .discriminatedUnion('kind', [
    z.strictObject({
      criterionId: Id.describe('Name of the criterion'),
      kind: z.literal('negatives').describe('Negative results in a row'),
      testKey: Id.describe('Which results count: those with the same key'),
      count: z.int().min(1).max(10).describe('How many in a row'),
      daysApart: Days.describe('Least days from one sample to the next'),
      daysAfterMasking: Days.describe('Least days of the last after the last masking treatment'),
    }),
    z.strictObject({
      criterionId: Id.describe('Name of the criterion'),
      kind: z.literal('declared').describe('Something that a person declares met'),
    }),
  ])
  .describe('What has to be met before clearance')

/** A policy of which anything may be left out; the program's default takes its place. */
const policyFields = {
  requiredDays: Days.describe('Days from day 0 to the earliest clearance when nothing happens'),
  deathExtensionDays: Days.describe('Days to wait after an unexplained death'),
  signsExtensionDays: Days.describe('Days to wait after new clinical signs'),
  maskingWindowDays: Days.describe('Days after a treatment that hides what the tests look for'),
  transportDeathHours: Hours.describe('Hours after arrival within which a death is put down to the journey'),
  temperaturePauseHours: Hours.describe('A temperature spell pauses the clock when it lasts longer'),
  criteria: z.array(Criterion).max(10).describe('What has to be met before clearance'),
}
export const WholePolicy = z.strictObject(policyFields).describe('How days are counted')
export const AskedPolicy = WholePolicy.partial().describe(
  'How days are counted; what is left out is taken from the defaults of this program',
)

const kind = <const K extends ClockEventBody['kind']>(name: K, what: string) => z.literal(name).describe(what)
const base = {
  eventId: Id.optional().describe('Name of the event; its place in the list unless given'),
  at: Instant.describe('When it happened; of a result, when it was reported'),
}

const event = <S extends z.core.$ZodLooseShape>(shape: S) => z.strictObject({ ...base, ...shape })

/** Anything that can happen to a case in quarantine. */
export const AskedEvent = z
  .discriminatedUnion('kind', [
    event({
      kind: kind('arrival', 'A box or animal of the batch came in; after closing it is an addition'),
      quarantineKind: z.enum(quarantineKinds).describe('Quarantine kind of what came'),
      ...whoCame,
    }),
    event({ kind: kind('closed', 'The last of the batch is in') }),
    event({
      kind: kind('addition', 'Something entered after closing'),
      what: z.enum(['animals', 'wet-material', 'undisinfected-gear']).describe('What came in'),
      quarantineKind: z
        .enum(quarantineKinds)
        .nullable()
        .describe('Of the animals; null for material and gear'),
      into: z.enum(['same-water', 'connected-water', 'same-room']).describe('Where to'),
      ...whoCame,
    }),
    event({
      kind: kind('breach', 'Contact with another unit'),
      how: z.enum(['escape', 'splash', 'net', 'other']).describe('How'),
      otherUnitStatus: z.enum(['lower', 'same-or-higher']).describe('Status of the other unit'),
    }),
    event({
      kind: kind('death', 'Deaths'),
      deathCount: Count.optional().describe('How many; one unless told'),
      arrivedAt: Instant.optional().describe('Arrival of the dead animal, when it came apart'),
    }),
    event({
      kind: kind('death-cause-signed', 'A veterinarian signed what a death was from'),
      deathEventId: Id.describe('The death'),
      finding: z
        .enum(['explained-not-transmissible', 'explained-transmissible', 'unexplained'])
        .describe('What was found'),
      cause: Name.optional().describe('In words'),
    }),
    event({
      kind: kind('transport-death-extends', 'A death soon after arrival extends all the same'),
      deathEventId: Id.describe('The death'),
    }),
    event({
      kind: kind('clinical-signs', 'New clinical signs'),
      signs: Name.optional().describe('In words'),
    }),
    event({
      kind: kind('not-feeding', 'Not feeding'),
      subject: Name.min(1).describe('The animal, or the group as a whole'),
    }),
    event({
      kind: kind('feeding', 'Feeding again'),
      subject: Name.min(1).describe('As it was reported'),
    }),
    event({
      kind: kind('extension-ended', 'A veterinarian ends an extension'),
      extensionEventId: Id.describe('Event that the extension comes from'),
    }),
    event({
      kind: kind('treatment-started', 'A treatment began'),
      plannedEndOn: LocalDate.optional().describe('Day on which it is to end'),
      ...treatment,
    }),
    event({
      kind: kind('treatment-ended', 'The agent is out of the water, or the last dose given'),
      ...treatment,
    }),
    event({
      kind: kind('pause-started', 'The clock stands still from here on'),
      pauseId: Id.describe('The same name at its start and at its end'),
      cause: z.enum(['life-support-failure', 'temperature-out-of-range']).describe('Why'),
    }),
    event({ kind: kind('pause-ended', 'The clock goes on'), pauseId: Id.describe('The pause') }),
    event({
      kind: kind('sample-result', 'A result was reported'),
      sampleId: Id.describe('The sample'),
      testKey: Id.describe('Which test'),
      takenAt: Instant.describe('When the sample was taken'),
      result: z.enum(['negative', 'positive', 'inconclusive', 'insufficient']).describe('The result'),
      pathogenName: Name.optional().describe('Of a positive: what was found'),
      pathogenStatus: z
        .enum(['listed', 'facility-critical', 'other'])
        .optional()
        .describe('Of a positive: whether it is notifiable or critical to the facility'),
    }),
    event({
      kind: kind('locked', 'No movement and no clearance from here on'),
      cause: z.enum(['notifiable-suspicion', 'veterinarian', 'held']).describe('Why'),
    }),
    event({
      kind: kind('unlocked', 'A veterinarian lifts a lock or hold'),
      lockEventId: Id.describe('The event that locked'),
    }),
    event({
      kind: kind('criterion-declared', 'A criterion declared met or not'),
      criterionId: Id.describe('The criterion'),
      met: z.boolean().describe('Whether it is met'),
    }),
    event({ kind: kind('protocol-changed', 'Another policy from here on'), policy: WholePolicy }),
    event({
      kind: kind('cleared-water-joined', 'Its water was joined with water of cleared animals'),
      animalCount: Count.optional().describe('How many cleared animals'),
    }),
    event({
      kind: kind('exposure-decided', 'A veterinarian decided about an exposure'),
      exposureEventId: Id.describe('The event of the exposure'),
      decision: z.enum(['new-case', 'no-case']).describe('What was decided'),
    }),
    event({ kind: kind('cleared', 'The end of quarantine, signed') }),
    event({ kind: kind('transferred-out', 'The whole batch left for another quarantine') }),
    event({
      kind: kind('voided', 'As if the other event had never been'),
      voidsEventId: Id.describe('The other event'),
    }),
  ])
  .describe('Something that happened')

// every kind of the domain has its entry here, and its fields are the domain's
type Same<A, B> = [A] extends [B] ? ([B] extends [A] ? true : never) : never
type Asked = z.infer<typeof AskedEvent>
export const coversEveryKind: Same<Asked['kind'], ClockEventBody['kind']> = true
export const policyIsWhole: Same<keyof z.infer<typeof WholePolicy>, keyof ClockPolicy> = true
