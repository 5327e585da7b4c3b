import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/people.contract.ts'
import { lastDayOf } from '../../../shared/domain/licences/licence-classes.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import * as repository from './people.repository.ts'
import type { LicenceRecord, Person } from './person.entity.ts'
import { personSubject as subject } from './person-subject.ts'

type LicenceGiven = BodyOf<typeof contracts.enterLicence>

const saidOf = (row: LicenceRecord) => ({
  id: row.id,
  class: row.class ?? 'veterinary',
  jurisdiction: row.jurisdiction,
  number: row.number,
  validFrom: row.validFrom,
  validUntil: row.validUntil,
})

/** Licences of a person: entered, corrected by another entry in their place, ended before their time, voided. */
export function createLicencesService(parts: { transactions: Transactions; ids: Ids }) {
  function refuseReversed({ validFrom, validUntil }: LicenceGiven): void {
    if (validUntil < validFrom)
      throw new Problem('period-reversed', {
        errors: [{ pointer: '/validUntil', detail: 'The last day has to be on or after the first day.' }],
      })
  }

  /** A licence of the person, whose row is locked until the transaction ends. */
  async function lockLicence(
    tx: Tx,
    personId: string,
    licenceId: string,
  ): Promise<{ person: Person; licence: LicenceRecord }> {
    const person = await repository.lockPerson(tx, personId)
    const licence = await repository.findLicence(tx, licenceId)
    if (!person || licence?.personId !== personId) throw new Problem('not-found')
    return { person, licence }
  }

  /** One that another entry stands in for, or that is void, is not changed again. */
  async function refuseGone(tx: Tx, licenceId: string): Promise<void> {
    if ((await repository.isSuperseded(tx, licenceId)) || (await repository.isVoid(tx, licenceId)))
      throw new Problem('licence-changed', { detail: peopleWords.licenceChanged })
  }

  return {
    async enterLicence(context: RequestContext, personId: string, given: LicenceGiven): Promise<void> {
      refuseReversed(given)
      await parts.transactions.inTransaction(context, async (tx) => {
        const person = await repository.lockPerson(tx, personId)
        if (!person) throw new Problem('not-found')
        const row = {
          ...given,
          personId,
          supersedesId: null,
          reason: null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        const { created } = await repository.insertLicence(tx, row)
        if (created) tx.audit({ action: 'licence.enter', subject: subject(person), after: saidOf(row) })
      })
    },

    /** Another entry takes the place of a licence; the earlier one stays readable. @refuses licence-changed */
    async correctLicence(
      context: RequestContext,
      personId: string,
      licenceId: string,
      given: BodyOf<typeof contracts.correctLicence>,
    ): Promise<void> {
      refuseReversed(given)
      await parts.transactions.inTransaction(context, async (tx) => {
        const { person, licence } = await lockLicence(tx, personId, licenceId)
        const row = {
          ...given,
          personId,
          supersedesId: licenceId,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        // the same correction sent again finds itself in the place of the licence
        if (!(await repository.findLicence(tx, given.id))) await refuseGone(tx, licenceId)
        const { created } = await repository.insertLicence(tx, row)
        if (created)
          tx.audit({
            action: 'licence.correct',
            subject: subject(person),
            before: saidOf(licence),
            after: { ...saidOf(row), reason: given.reason },
          })
      })
    },

    /** Ends a licence before its last day as printed. @refuses licence-changed, bad-input */
    async endLicence(
      context: RequestContext,
      personId: string,
      licenceId: string,
      given: BodyOf<typeof contracts.endLicence>,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const { person, licence } = await lockLicence(tx, personId, licenceId)
        await refuseGone(tx, licenceId)
        if (await repository.isEnded(tx, licenceId))
          throw new Problem('licence-changed', { detail: peopleWords.licenceChanged })
        if (given.endedOn < licence.validFrom || given.endedOn > lastDayOf({ ...licence, endedOn: null }))
          throw refusedInput('/endedOn', peopleWords.endOutside, 'out-of-range')
        await repository.insertLicenceEnd(tx, {
          id: parts.ids.next(),
          licenceId,
          ...given,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'licence.end',
          subject: subject(person),
          before: saidOf(licence),
          after: { ...given },
        })
      })
    },

    /** Voids a licence with a reason; voiding it a second time changes nothing. @refuses licence-changed */
    async voidLicence(
      context: RequestContext,
      personId: string,
      licenceId: string,
      reason: string,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const { person, licence } = await lockLicence(tx, personId, licenceId)
        if (await repository.isVoid(tx, licenceId)) return
        await refuseGone(tx, licenceId)
        await repository.insertLicenceVoid(tx, {
          id: parts.ids.next(),
          licenceId,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'licence.void',
          subject: subject(person),
          before: { jurisdiction: licence.jurisdiction, number: licence.number },
          after: { reason },
        })
      })
    },
  }
}
