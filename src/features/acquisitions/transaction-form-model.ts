import type { Zone } from '../../../shared/domain/time/instant.ts'
import { instantOfLocalTime } from '../../../shared/domain/time/local-time.ts'
import { transactionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import type {
  TransactionKind,
  TransactionKindRules,
} from '../../../shared/domain/register/transaction-kinds.ts'
import { newId } from '../../lib/new-id.ts'
import { typedNumber, typedText } from '../../lib/typed-text.ts'
import type { PaperGiven } from '../documents/index.ts'

/** One animal or group that comes, as the form holds it: text as typed, nothing chosen beforehand. */
export interface LineValues {
  id: string
  /** Id of the new animal or group. */
  newAnimalId: string
  record: 'new' | 'existing'
  /** The group that animals are added to, or the animal that leaves. */
  animalId: string | null
  /** What the chosen animal is, and how many it counts; unknown until one is chosen. */
  chosenForm: 'individual' | 'group' | null
  taxonId: string | null
  form: 'individual' | 'group' | null
  count: string
  known: 'counted' | 'estimated' | null
  estimate: { low: string; high: string }
  enclosureId: string | null
  deadOnArrival: string
  name: string
  sex: string
  lifeStage: string
  birthKind: string
  birthDate: string
  birthApproximate: boolean
  theirNumber: string
  sourceCode: string
  transponder: string
  transponderId: string
}

export interface PermitUseValues {
  id: string
  permitId: string | null
  lineId: string
  quantity: string
}

export interface TransactionValues {
  id: string
  kind: string
  stage: 'now' | 'already' | null
  on: string
  time: string
  counterpartyId: string | null
  newCounterparty: { id: string; name: string; kind: string; registration: string } | null
  reference: string
  loanDueOn: string
  place: {
    locality: string
    on: string
    method: string
    latitude: string
    longitude: string
    uncertaintyMetres: string
  }
  transport: {
    carrier: string
    waybill: string
    boxCount: string
    sealedAt: string
    openedAt: string
    note: string
  }
  note: string
  lines: LineValues[]
  permitUses: PermitUseValues[]
  papers: PaperGiven[]
}

export const blankLine = (): LineValues => ({
  id: newId(),
  newAnimalId: newId(),
  record: 'new',
  animalId: null,
  chosenForm: null,
  taxonId: null,
  form: null,
  count: '',
  known: null,
  estimate: { low: '', high: '' },
  enclosureId: null,
  deadOnArrival: '',
  name: '',
  sex: '',
  lifeStage: '',
  birthKind: '',
  birthDate: '',
  birthApproximate: false,
  theirNumber: '',
  sourceCode: '',
  transponder: '',
  transponderId: newId(),
})

export const blankTransaction = (): TransactionValues => ({
  id: newId(),
  kind: '',
  stage: null,
  on: '',
  time: '',
  counterpartyId: null,
  newCounterparty: null,
  reference: '',
  loanDueOn: '',
  place: { locality: '', on: '', method: '', latitude: '', longitude: '', uncertaintyMetres: '' },
  transport: { carrier: '', waybill: '', boxCount: '', sealedAt: '', openedAt: '', note: '' },
  note: '',
  lines: [blankLine()],
  permitUses: [],
  papers: [],
})

export const blankPermitUse = (lineId: string): PermitUseValues => ({
  id: newId(),
  permitId: null,
  lineId,
  quantity: '',
})

/** What is asked of the chosen kind; null while none is chosen. */
export function rulesOf(kind: string): TransactionKindRules | null {
  return kind in transactionKinds ? transactionKinds[kind as TransactionKind] : null
}

/** The instant that a date-and-time field means by facility time; undefined while it is empty or half typed. */
function instantOf(moment: string, zone: Zone): string | undefined {
  const [date, time] = moment.split('T')
  return date && time ? instantOfLocalTime(date, time.slice(0, 5), zone) : undefined
}

/** An object of what was said in it; null when nothing was. */
function said<T extends object>(fields: T): T | null {
  return Object.values(fields).some((value) => value !== undefined) ? fields : null
}

function sharedBody(values: TransactionValues, zone: Zone) {
  const { place, transport, newCounterparty } = values
  const rules = rulesOf(values.kind)
  const named = rules?.party !== 'none'
  return {
    id: values.id,
    kind: typedText(values.kind),
    stage: rules?.befalls ? ('already' as const) : (values.stage ?? undefined),
    on: typedText(values.on),
    time: typedText(values.time) ?? null,
    counterpartyId: named && newCounterparty === null ? values.counterpartyId : null,
    newCounterparty:
      named && newCounterparty
        ? {
            id: newCounterparty.id,
            name: typedText(newCounterparty.name),
            kind: typedText(newCounterparty.kind),
            registration: typedText(newCounterparty.registration) ?? null,
          }
        : null,
    reference: typedText(values.reference) ?? null,
    place: said({
      locality: typedText(place.locality),
      on: typedText(place.on),
      method: typedText(place.method),
      latitude: typedNumber(place.latitude),
      longitude: typedNumber(place.longitude),
      uncertaintyMetres: typedNumber(place.uncertaintyMetres),
    }),
    transport: said({
      carrier: typedText(transport.carrier),
      waybill: typedText(transport.waybill),
      boxCount: typedNumber(transport.boxCount),
      sealedAt: instantOf(transport.sealedAt, zone),
      openedAt: instantOf(transport.openedAt, zone),
      note: typedText(transport.note),
    }),
    loanDueOn: rules?.loan ? (typedText(values.loanDueOn) ?? null) : null,
    note: typedText(values.note) ?? null,
    permitUses: values.permitUses.map((use) => ({
      id: use.id,
      permitId: use.permitId ?? undefined,
      lineId: values.lines.length === 1 ? values.lines[0]?.id : typedText(use.lineId),
      quantity: typedNumber(use.quantity),
    })),
  }
}

function lineBody(line: LineValues) {
  if (line.record === 'existing')
    return {
      record: 'existing' as const,
      id: line.id,
      animalId: line.animalId ?? undefined,
      count: typedNumber(line.count),
      deadOnArrival: typedNumber(line.deadOnArrival) ?? null,
      sourceCode: typedText(line.sourceCode) ?? null,
    }
  const isGroup = line.form === 'group'
  const transponder = typedText(line.transponder)
  return {
    record: 'new' as const,
    id: line.id,
    animalId: line.newAnimalId,
    taxonId: line.taxonId ?? undefined,
    form: line.form ?? undefined,
    name: typedText(line.name) ?? null,
    sex: typedText(line.sex) ?? 'unknown',
    lifeStage: typedText(line.lifeStage) ?? 'unknown',
    birthKind: typedText(line.birthKind) ?? null,
    birthDate: typedText(line.birthDate) ?? null,
    birthApproximate: line.birthApproximate,
    count: line.form === 'individual' ? 1 : typedNumber(line.count),
    // a group says how its number is known; the form asks until it does
    estimate: !isGroup
      ? null
      : line.known === 'estimated'
        ? { low: typedNumber(line.estimate.low), high: typedNumber(line.estimate.high) }
        : null,
    enclosureId: line.enclosureId ?? undefined,
    deadOnArrival: typedNumber(line.deadOnArrival) ?? null,
    theirNumber: typedText(line.theirNumber) ?? null,
    sourceCode: typedText(line.sourceCode) ?? null,
    ...(transponder === undefined
      ? {}
      : { identifiers: [{ id: line.transponderId, kind: 'transponder' as const, value: transponder }] }),
  }
}

/** The body of an acquisition as far as the form holds it; what is missing is left out, so that the schema asks for it. */
export function acquisitionBody(values: TransactionValues, zone: Zone) {
  return { ...sharedBody(values, zone), lines: values.lines.map(lineBody) }
}

/** The body of a disposition, in the same way. */
export function dispositionBody(values: TransactionValues, zone: Zone) {
  return {
    ...sharedBody(values, zone),
    lines: values.lines.map((line) => ({
      id: line.id,
      animalId: line.animalId ?? undefined,
      count: line.chosenForm === 'individual' ? 1 : typedNumber(line.count),
    })),
  }
}

/** Faults that no schema knows: a kind that needs a party, a group whose number is neither counted nor estimated. */
export function ownFaults(values: TransactionValues, way: 'in' | 'out'): string[] {
  const rules = rulesOf(values.kind)
  const missing: string[] = []
  if (rules?.party === 'needed' && values.counterpartyId === null && values.newCounterparty === null)
    missing.push('counterpartyId')
  if (way === 'in')
    values.lines.forEach((line, i) => {
      if (line.record === 'new' && line.form === 'group' && line.known === null)
        missing.push(`lines.${String(i)}.known`)
    })
  return missing
}
