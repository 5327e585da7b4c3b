import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/formulary.contract.ts'
import { defaultDoseLines } from '../../../shared/domain/formulary/default-dose-lines.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { agentNames, lotWords } from '../../../shared/messages/formulary.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Ids } from '../../platform/ids.ts'
import { timeNotAhead } from '../../platform/http/check-time.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { installation } from '../../platform/http/request-context.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { FacilityService } from '../facility/index.ts'
import type { ValidLicence } from '../people/index.ts'
import { checkDensity, checkStrength } from './check-strength.ts'
import type { DoseLineRow } from './formulary.entity.ts'
import * as repository from './formulary.repository.ts'

export interface FormularyParts {
  transactions: Transactions
  clock: Clock
  ids: Ids
  facility: FacilityService
  validLicence(personId: string, at: Date): Promise<ValidLicence | null>
  /** @refuses sign-in-locked */
  refuseWhileLocked(personId: string): Promise<void>
}

const productSubject = (row: { id: string; productName: string }) => ({
  kind: 'product',
  id: row.id,
  label: row.productName,
})
const lineSubject = (row: Pick<DoseLineRow, 'id' | 'agent'>) => ({
  kind: 'dose-line',
  id: row.id,
  label: agentNames[row.agent as keyof typeof agentNames],
})
const figuresOf = (row: DoseLineRow) => ({
  low: row.low,
  high: row.high,
  unit: row.unit,
  longestContactMinutes: row.longestContactMinutes,
})

export function createFormularyService(parts: FormularyParts) {
  async function productOfLot(tx: Tx, lotId: string) {
    const lot = await repository.findLot(tx, lotId)
    if (!lot) throw new Problem('not-found')
    return lot
  }

  /** Nobody puts a lot back into use alone: another person than who took it out, and a recalled one a veterinarian. */
  async function checkReturn(tx: Tx, lotId: string): Promise<void> {
    const standing = await repository.findStandingEvents(tx, lotId)
    const isRecalled = standing.some(({ kind }) => kind === 'recalled')
    const isAnother = standing.every((event) => event.recorded_by !== tx.actor.personId)
    if (decide('lot.return', tx.actor.roles, { 'another-person': isAnother && !isRecalled }).allowed) return
    throw new Problem(isRecalled ? 'may-not' : 'another-person-needed', {
      detail: isRecalled ? lotWords.recalledReturn : lotWords.ownReturn,
    })
  }

  return {
    /** Puts the project's default lines into the ledger, each once; called at every start. */
    async loadDefaults(): Promise<void> {
      await parts.transactions.inTransaction({ actor: installation, requestId: 'start' }, async (tx) => {
        for (const line of defaultDoseLines) {
          if (await repository.findDoseLine(tx, line.id)) continue
          const row = { ...line, reason: null, supersedesId: null, proposedAt: tx.at, proposedBy: null }
          await repository.insertDoseLine(tx, row)
          tx.audit({ action: 'dose-line.load-default', subject: lineSubject(row), after: figuresOf(row) })
        }
      })
    },

    async enterProduct(context: RequestContext, given: BodyOf<typeof contracts.enterProduct>): Promise<void> {
      const strength = checkStrength(given)
      const densityGPerMl = checkDensity(given.density)
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = {
          id: given.id,
          agent: given.agent,
          productName: given.productName,
          form: given.form,
          strengthEnteredValue: strength.value,
          strengthEnteredUnit: strength.unit,
          strengthBasis: given.strengthBasis,
          densityGPerMl,
          inUse: true,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const { created } = await repository.insertProduct(tx, row)
        if (created)
          tx.audit({
            action: 'product.enter',
            subject: productSubject(row),
            after: { agent: row.agent, strength: { ...strength }, basis: row.strengthBasis, densityGPerMl },
          })
      })
    },

    async withdrawProduct(
      context: RequestContext,
      id: string,
      given: { expectedVersion: number; inUse: boolean },
    ) {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.lockProduct(tx, id)
        if (!row) throw new Problem('not-found')
        await repository.saveProduct(tx, { id, version: given.expectedVersion }, { inUse: given.inUse })
        tx.audit({
          action: 'product.set-use',
          subject: productSubject(row),
          before: { inUse: row.inUse },
          after: { inUse: given.inUse },
        })
      })
    },

    async receiveLot(context: RequestContext, productId: string, given: BodyOf<typeof contracts.receiveLot>) {
      await parts.transactions.inTransaction(context, async (tx) => {
        const product = await repository.lockProduct(tx, productId)
        if (!product) throw new Problem('not-found')
        const row = { ...given, productId, recordedAt: tx.at, recordedBy: tx.actor.personId }
        const { created } = await repository.insertLot(tx, row)
        const { lotNumber, expiresOn, receivedOn } = given
        if (created)
          tx.audit({
            action: 'lot.receive',
            subject: productSubject(product),
            after: { lotNumber, expiresOn, receivedOn },
          })
      })
    },

    async noteLotEvent(context: RequestContext, lotId: string, given: BodyOf<typeof contracts.noteLotEvent>) {
      const happenedAt = timeNotAhead(given.happenedAt, parts.clock.now())
      await parts.transactions.inTransaction(context, async (tx) => {
        const lot = await productOfLot(tx, lotId)
        if (given.kind === 'returned-to-use' && !(await repository.hasLotEvent(tx, given.id)))
          await checkReturn(tx, lotId)
        const { created } = await repository.insertLotEvent(tx, {
          id: given.id,
          lotId,
          kind: given.kind,
          happenedAt,
          happenedOn: await parts.facility.dateOf(happenedAt, tx),
          note: given.note ?? null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (created)
          tx.audit({
            action: 'lot.note',
            subject: { kind: 'lot', id: lotId, label: lot.lotNumber },
            after: { kind: given.kind, note: given.note },
          })
      })
    },

    async proposeDoseLine(
      context: RequestContext,
      given: BodyOf<typeof contracts.proposeDoseLine>,
    ): Promise<void> {
      if (given.low !== null && given.low > given.high)
        throw new Problem('bad-input', {
          errors: [{ pointer: '/low', detail: 'The lower end has to be at most the upper end.' }],
        })
      await parts.transactions.inTransaction(context, async (tx) => {
        const before = await repository.findDoseLine(tx, given.supersedesId)
        if (!before) throw new Problem('not-found')
        const row = {
          ...before,
          id: given.id,
          low: given.low,
          high: given.high,
          longestContactMinutes: given.longestContactMinutes,
          mark: 'P',
          source: 'project-default',
          reason: given.reason,
          supersedesId: before.id,
          proposedAt: tx.at,
          proposedBy: tx.actor.personId,
        }
        const { created } = await repository.insertDoseLine(tx, row)
        if (created)
          tx.audit({
            action: 'dose-line.propose',
            subject: lineSubject(row),
            before: figuresOf(before),
            after: { ...figuresOf(row), reason: given.reason },
          })
      })
    },

    /** Confirms a line for this facility: a veterinarian with a licence valid today. */
    async confirmDoseLine(context: RequestContext, id: string, reason: string | undefined): Promise<void> {
      const personId = context.actor.personId
      if (personId === null) throw new Problem('not-signed-in')
      if (!(await parts.validLicence(personId, parts.clock.now()))) throw new Problem('licence-not-valid')
      await parts.refuseWhileLocked(personId)
      await parts.transactions.inTransaction(context, async (tx) => {
        const line = await repository.findDoseLine(tx, id)
        if (!line) throw new Problem('not-found')
        if (await repository.isConfirmed(tx, id)) throw new Problem('already-confirmed')
        await repository.insertDoseLineConfirmation(tx, {
          id: parts.ids.next(),
          doseLineId: id,
          confirmedAt: tx.at,
          confirmedBy: personId,
          reason: reason ?? null,
        })
        tx.audit({ action: 'dose-line.confirm', subject: lineSubject(line), after: figuresOf(line) })
      })
    },
  }
}

export type FormularyService = ReturnType<typeof createFormularyService>
