import type {
  NewAcquisition as AcquisitionGiven,
  NewDisposition as DispositionGiven,
} from '../../../shared/contracts/acquisition-bodies.ts'
import type { FieldProblem } from '../../../shared/contracts/problems.ts'
import { readPartialDate } from '../../../shared/domain/register/partial-date.ts'
import { hasPassed, placeInTime } from '../../../shared/domain/register/place-in-time.ts'
import type { PlacedEvent } from '../../../shared/domain/register/place-in-time.ts'
import { transactionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import { registerSentences as says } from '../../../shared/messages/register-sentences.ts'
import { Problem } from '../../platform/http/problem.ts'

export type { AcquisitionGiven, DispositionGiven }
export type Given = AcquisitionGiven | DispositionGiven

type Line = Given['lines'][number]
type NewLine = Extract<AcquisitionGiven['lines'][number], { record: 'new' }>
const isNew = (line: Line): line is NewLine => 'record' in line && line.record === 'new'

/**
 * What can be told of a transaction before anything is read: everything at fault at once.
 *
 * @returns where it stands in time
 * @throws in-the-future when nothing but times ahead is wrong, else bad-input
 */
export function checkGiven(given: Given, way: 'in' | 'out', zone: string, now: string): PlacedEvent {
  const errors: FieldProblem[] = []
  const wrong = (pointer: string, detail: string, code = 'bad-input') =>
    void errors.push({ pointer, detail, code })
  const placed = placeInTime({ on: given.on, time: given.time ?? undefined, way }, zone, now)
  if (!placed.ok) wrong(`/${placed.refusal.field ?? 'on'}`, says[placed.refusal.code], placed.refusal.code)

  const rules = transactionKinds[given.kind]
  const names = [given.counterpartyId, given.newCounterparty].filter(Boolean).length
  if (names === 0 && rules.party === 'needed') wrong('/counterpartyId', says.partyNeeded)
  if (names > 0 && rules.party === 'none') wrong('/counterpartyId', says.noParty)
  if (names > 1) wrong('/counterpartyId', says.partyOnce)
  if (given.loanDueOn && !rules.loan) wrong('/loanDueOn', says.loanOnly)

  const { sealedAt, openedAt } = given.transport ?? {}
  for (const [field, at] of [
    ['sealedAt', sealedAt],
    ['openedAt', openedAt],
  ] as const)
    if (at && !hasPassed(at, now)) wrong(`/transport/${field}`, says['in-the-future'], 'in-the-future')
  if (sealedAt && openedAt && Date.parse(openedAt) < Date.parse(sealedAt))
    wrong('/transport/openedAt', says.openedBeforeSealed)

  const { latitude, longitude, on: placeDate } = given.place ?? {}
  if ((latitude ?? null) === null ? (longitude ?? null) !== null : (longitude ?? null) === null)
    wrong('/place/latitude', says.coordinatesInPairs)
  const latest = placed.ok ? placed.value.last : null
  const isLater = (text: string) => {
    const read = readPartialDate(text)
    return latest !== null && read.ok && read.value.first > latest
  }
  if (placeDate && isLater(placeDate)) wrong('/place/on', says.afterArrival)

  const animals = new Set<string>()
  given.lines.forEach((line, index) => {
    const at = `/lines/${String(index)}`
    if (animals.has(line.animalId)) wrong(`${at}/animalId`, says.lineTwice)
    animals.add(line.animalId)
    if (!isNew(line)) return
    if (line.form === 'individual' && (line.count !== 1 || line.estimate))
      wrong(`${at}/count`, says.individualIsOne)
    if (line.estimate && (line.estimate.low > line.count || line.estimate.high < line.count))
      wrong(`${at}/estimate`, says.estimateAround)
    if (line.birthDate && isLater(line.birthDate)) wrong(`${at}/birthDate`, says.afterArrival)
  })
  const lineIds = new Set(given.lines.map((line) => line.id))
  given.permitUses.forEach((use, index) => {
    if (!lineIds.has(use.lineId)) wrong(`/permitUses/${String(index)}/lineId`, says.unknownLine)
  })

  if (!placed.ok || errors.length > 0) {
    const ahead = errors.every((error) => error.code === 'in-the-future')
    throw new Problem(ahead ? 'in-the-future' : 'bad-input', {
      errors,
      detail: errors.map((error) => error.detail).join(' '),
    })
  }
  return placed.value
}

/** Runs a step for one line of the form, so that its refusal points at the fields of that line. */
export async function forLine<T>(index: number, step: () => Promise<T>): Promise<T> {
  try {
    return await step()
  } catch (error) {
    if (!(error instanceof Problem)) throw error
    const root = `/lines/${String(index)}`
    const { detail, errors } = error.details
    const rooted = errors?.map((one) => ({ ...one, pointer: `${root}${one.pointer}` }))
    throw new Problem(error.code, {
      ...error.details,
      errors: rooted ?? [{ pointer: `${root}/animalId`, detail: detail ?? '' }],
    })
  }
}
