import type { BirthKind, IdentifierKind, LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import { identifierKey, readTransponder } from '../../../shared/domain/animals/read-transponder.ts'
import { readPartialDate } from '../../../shared/domain/register/partial-date.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { FactTimes } from '../facility/index.ts'
import type { Animal } from './animal.entity.ts'
import { Identifier } from './animal.entity.ts'
import * as repository from './animals.repository.ts'
import { readLiveMoves } from './ledgers.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts, Moves } from './moves.service.ts'
import { refuseField } from './refuse.ts'
import { findTaxon } from './taxa.repository.ts'

export interface Birth {
  kind: BirthKind
  date: string
  approximate: boolean
}

export interface DescriptionRequest {
  expectedVersion: number
  taxonId: string
  name: string | null
  sex: Sex
  stage: LifeStage
  birth: Birth | null
  reason?: string | undefined
  happenedAt: string
}

export interface IdentifierRequest {
  id: string
  kind: IdentifierKind
  value: string
  place?: string | undefined
  readTwiceReason?: string | undefined
  happenedAt: string
}

export const birthColumns = (birth: Birth | null) => ({
  birthKind: birth?.kind ?? null,
  birthDate: birth?.date ?? null,
  birthApproximate: birth?.approximate ?? false,
})

/** Who an animal is: its description from an instant on, and its marks. */
export function createIdentify(parts: MoveParts & { moves: Moves }) {
  const { facility, ledgers, moves } = parts

  /** Writes a mark; one that another animal carries is refused, or kept with a discrepancy when it was really read. */
  async function writeIdentifier(
    tx: Tx,
    animal: Animal,
    given: IdentifierRequest,
    times: FactTimes,
  ): Promise<void> {
    const read = given.kind === 'transponder' ? readTransponder(given.value) : null
    if (read && !read.ok) {
      const { code } = read.refusal
      throw refuseField(
        'bad-input',
        '/value',
        code === 'blank' ? animalRefusals.blankMark : animalRefusals[code],
      )
    }
    const valueKey = read?.ok ? read.value.key : identifierKey(given.value)
    if (valueKey === '') throw refuseField('bad-input', '/value', animalRefusals.blankMark)
    await repository.lockMark(tx, valueKey)
    const carrier = await repository.whoCarries(tx, valueKey, animal.id)
    if (carrier !== null && given.readTwiceReason === undefined)
      throw refuseField(
        'mark-already-carried',
        '/value',
        animalRefusals.markCarried({ value: given.value, accession: carrier }),
      )
    await repository.insertIdentifier(tx, {
      id: given.id,
      animalId: animal.id,
      kind: given.kind,
      value: given.value,
      valueKey,
      place: given.place ?? null,
      twiceReason: carrier === null ? null : (given.readTwiceReason ?? null),
      ...times,
    })
    tx.audit({
      action: 'animal.mark',
      subject: subjectOf(animal),
      after: { kind: given.kind, value: given.value, place: given.place },
    })
    if (carrier !== null)
      await ledgers.openDiscrepancy(tx, animal, {
        kind: 'identifier-twice',
        source: { kind: 'identifier', id: given.id },
        facts: { value: given.value, other: carrier, reason: given.readTwiceReason ?? '' },
        times,
      })
  }

  /** Nothing is born ahead of today, nor after it came; what came as an egg may hatch later. */
  async function refuseImpossibleBirth(tx: Tx, animal: Animal, birth: Birth): Promise<void> {
    const read = readPartialDate(birth.date)
    if (!read.ok) return
    const { first } = read.value
    if (first > facilityDateOf(tx.at.toISOString(), await facility.zone(tx)))
      throw refuseField('bad-input', '/birth/date', animalRefusals.bornAhead)
    const [arrival] = await readLiveMoves(tx, animal.id)
    if (birth.kind !== 'hatched' && arrival && first > arrival.happenedOn)
      throw refuseField(
        'bad-input',
        '/birth/date',
        animalRefusals.bornAfterArrival({ accession: animal.accession, on: arrival.happenedOn }),
      )
  }

  return {
    writeIdentifier,

    /** Describes an animal from an instant on; earlier descriptions stay readable. */
    async describeAnimal(
      context: RequestContext,
      accession: string,
      given: DescriptionRequest,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        if (!(await findTaxon(tx, given.taxonId)))
          throw refuseField('not-found', '/taxonId', animalRefusals.noSuchTaxon)
        if (given.birth) await refuseImpossibleBirth(tx, animal, given.birth)
        const { taxonId, name, sex, stage } = given
        await repository.insertDescription(tx, {
          id: parts.ids.next(),
          animalId: animal.id,
          taxonId,
          name: name === '' ? null : name,
          sex,
          stage,
          ...birthColumns(given.birth),
          reason: given.reason ?? null,
          ...times,
        })
        await repository.takeNewestDescription(tx, { id: animal.id, version: given.expectedVersion })
        tx.audit({
          action: 'animal.describe',
          subject: subjectOf(animal),
          before: {
            taxonId: animal.taxonId,
            name: animal.name,
            sex: animal.sex,
            stage: animal.stage,
            birthDate: animal.birthDate,
          },
          after: { taxonId, name, sex, stage, birthDate: given.birth?.date, reason: given.reason },
        })
      })
    },

    /** Records a mark put on or read. */
    async addIdentifier(context: RequestContext, accession: string, given: IdentifierRequest): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const { id, kind, value } = given
        const content = { id, animalId: animal.id, kind, value, happenedAt: times.happenedAt }
        if (await isRepeated(tx, Identifier, content)) return
        if (given.kind === 'transponder' && animal.form !== 'individual')
          throw refuseField('not-a-single-animal', '/kind', animalRefusals.individualsOnly({ accession }))
        await writeIdentifier(tx, animal, given, times)
      })
    },

    /** Says that a mark is no longer on the animal; saying it twice changes nothing. */
    async endIdentifier(
      context: RequestContext,
      accession: string,
      identifierId: string,
      given: { reason: string; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await moves.lockByAccession(tx, accession)
        const times = await facility.timesOf(tx, given.happenedAt)
        const mark = await repository.findIdentifier(tx, identifierId)
        if (mark?.animalId !== animal.id) throw new Problem('not-found')
        if (await repository.hasIdentifierEnded(tx, identifierId)) return
        await repository.insertIdentifierEnd(tx, {
          id: parts.ids.next(),
          identifierId,
          reason: given.reason,
          ...times,
        })
        tx.audit({
          action: 'animal.end-mark',
          subject: subjectOf(animal),
          before: { kind: mark.kind, value: mark.value },
          after: { reason: given.reason },
        })
      })
    },
  }
}

export type Identify = ReturnType<typeof createIdentify>
