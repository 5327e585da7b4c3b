import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { PlacedEvent } from '../../../shared/domain/register/place-in-time.ts'
import { transactionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import { registerSentences as says } from '../../../shared/messages/register-sentences.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import { fingerprintOf } from '../../platform/pdf/fingerprint.ts'
import type { Animals } from '../animals/index.ts'
import type { CounterpartiesService } from '../counterparties/index.ts'
import type { FacilityService } from '../facility/index.ts'
import type { PermitsService } from '../permits/index.ts'
import { checkResidues } from './check-residues.ts'
import type { WithdrawalHoldOf } from './check-residues.ts'
import { checkGiven, forLine } from './check-given.ts'
import type { AcquisitionGiven, DispositionGiven, Given } from './check-given.ts'
import type { TransactionLine, TransactionRecord } from './transaction.entity.ts'
import * as repository from './transactions.repository.ts'

export interface AcquisitionsParts {
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  counterparties: CounterpartiesService
  permits: PermitsService
  animals: Pick<Animals, 'service' | 'questions'>
  withdrawalHold: WithdrawalHoldOf
}

const subject = (transaction: { id: string; number: string }) => ({
  kind: 'transaction',
  id: transaction.id,
  label: transaction.number,
})

const animalsOf = (line: Pick<TransactionLine, 'count' | 'deadOnArrival'> | undefined) => ({
  alive: line?.count ?? 0,
  dead: line?.deadOnArrival ?? 0,
})

/** Lines of groups that are already here first, then new ones: so rows are locked before numbers are drawn. */
function inLockOrder<T extends { animalId: string; record?: string }>(lines: readonly T[]) {
  return lines
    .map((line, index) => ({ line, index }))
    .sort(
      (a, b) =>
        Number(a.line.record === 'new') - Number(b.line.record === 'new') ||
        (a.line.record === 'new' ? a.index - b.index : a.line.animalId < b.line.animalId ? -1 : 1),
    )
}

export function createAcquisitionsService(parts: AcquisitionsParts) {
  const { facility, animals } = parts

  /** Checks and heads a transaction; null when this very form was taken before. */
  async function begin(
    tx: Tx,
    given: Given,
    way: 'in' | 'out',
  ): Promise<{ head: TransactionRecord; placed: PlacedEvent } | { repeated: string }> {
    const contentHash = fingerprintOf(canonicalJson(given as unknown as Json))
    const earlier = await repository.findTransaction(tx, given.id)
    if (earlier) {
      if (earlier.way !== way || earlier.contentHash !== contentHash) throw new Problem('id-already-used')
      return { repeated: earlier.number }
    }
    const placed = checkGiven(given, way, await facility.zone(tx), tx.at.toISOString())
    if (given.newCounterparty) await parts.counterparties.enterIn(tx, given.newCounterparty)
    else if (given.counterpartyId && !(await parts.counterparties.exists(tx, given.counterpartyId)))
      throw new Problem('not-found', {
        detail: says.noSuchParty,
        errors: [{ pointer: '/counterpartyId', detail: says.noSuchParty }],
      })
    const { place, transport } = given
    const at = (text: string | null | undefined) => (text ? new Date(text) : null)
    return {
      placed,
      head: {
        id: given.id,
        number: await facility.nextNumber(tx, 'transaction'),
        way,
        kind: given.kind,
        stage: transactionKinds[given.kind].befalls ? 'already' : given.stage,
        happenedText: given.on,
        happenedTime: given.time ?? null,
        happenedAt: new Date(placed.at),
        happenedOn: placed.first,
        counterpartyId: given.newCounterparty?.id ?? given.counterpartyId ?? null,
        reference: given.reference ?? null,
        place: place?.locality ?? null,
        placeDate: place?.on ?? null,
        placeMethod: place?.method ?? null,
        latitude: place?.latitude ?? null,
        longitude: place?.longitude ?? null,
        uncertaintyMetres: place?.uncertaintyMetres ?? null,
        carrier: transport?.carrier ?? null,
        waybill: transport?.waybill ?? null,
        boxCount: transport?.boxCount ?? null,
        sealedAt: at(transport?.sealedAt),
        openedAt: at(transport?.openedAt),
        transportNote: transport?.note ?? null,
        loanDueOn: given.loanDueOn ?? null,
        note: given.note ?? null,
        contentHash,
        recordedAt: tx.at,
        recordedBy: tx.actor.personId,
      },
    }
  }

  /** Writes the transaction with its lines, takes animals under its permits, and notes it all. */
  async function finish(
    tx: Tx,
    given: Given,
    placed: PlacedEvent,
    head: TransactionRecord,
    lines: readonly (TransactionLine & { accession: string; taxonId: string })[],
  ): Promise<string> {
    await repository.insertTransaction(tx, head)
    for (const { accession: _accession, taxonId: _taxonId, ...line } of lines)
      await repository.insertLine(tx, line)
    const marks = await parts.permits.useUp(
      tx,
      given.permitUses.map((use, index) => ({
        ...use,
        animals: animalsOf(lines.find((line) => line.id === use.lineId)),
        transactionId: head.id,
        taxonId: lines.find((line) => line.id === use.lineId)?.taxonId ?? '',
        first: placed.first,
        last: placed.last,
        stage: head.stage,
        pointer: `/permitUses/${String(index)}/permitId`,
      })),
    )
    tx.audit({
      action: head.way === 'in' ? 'transaction.record-acquisition' : 'transaction.record-disposition',
      subject: subject(head),
      after: {
        kind: head.kind,
        stage: head.stage,
        on: head.happenedText,
        counterpartyId: head.counterpartyId,
        lines: lines.map((line) => ({ accession: line.accession, count: line.count })),
        permitUses: given.permitUses.map((use) => ({
          permitId: use.permitId,
          quantity: use.quantity,
          marks: marks.get(use.id) ?? [],
        })),
      },
    })
    return head.number
  }

  const blankLine = {
    estimateLow: null,
    estimateHigh: null,
    deadOnArrival: null,
    theirNumber: null,
    sourceCode: null,
    enclosureId: null,
  }

  return {
    /** Accessions animals; returns the number of the transaction. */
    recordAcquisition(context: RequestContext, given: AcquisitionGiven): Promise<string> {
      return parts.transactions.inTransaction(context, async (tx) => {
        const begun = await begin(tx, given, 'in')
        if ('repeated' in begun) return begun.repeated
        const { head, placed } = begun
        const lines: (TransactionLine & { accession: string; taxonId: string })[] = []
        for (const { line, index } of inLockOrder(given.lines)) {
          const common = {
            ...blankLine,
            id: line.id,
            transactionId: head.id,
            position: index + 1,
            animalId: line.animalId,
            count: line.count,
            deadOnArrival: line.deadOnArrival ?? null,
            sourceCode: line.sourceCode ?? null,
          }
          if (line.record === 'new') {
            const { accession } = await forLine(index, () =>
              animals.service.accessionAnimal(tx, {
                id: line.animalId,
                form: line.form,
                taxonId: line.taxonId,
                name: line.name ?? null,
                sex: line.sex,
                stage: line.lifeStage,
                birth: line.birthDate
                  ? {
                      kind: line.birthKind ?? 'born',
                      date: line.birthDate,
                      approximate: line.birthApproximate ?? false,
                    }
                  : null,
                count: line.count,
                ...(line.estimate ? { estimate: line.estimate } : {}),
                ...(line.identifiers ? { identifiers: line.identifiers } : {}),
                kind: given.kind,
                enclosureId: line.enclosureId,
                happenedAt: placed.at,
                isFact: head.stage === 'already',
              }),
            )
            lines.push({
              ...common,
              accession,
              taxonId: line.taxonId,
              accessioned: true,
              estimateLow: line.estimate?.low ?? null,
              estimateHigh: line.estimate?.high ?? null,
              theirNumber: line.theirNumber ?? null,
              enclosureId: line.enclosureId,
              countEntryId: await repository.firstEntryOf(tx, line.animalId),
            })
          } else {
            const [group] = await animals.questions.animalsById([line.animalId], tx.at, tx.manager)
            const pointer = `/lines/${String(index)}/animalId`
            if (!group) throw new Problem('not-found', { errors: [{ pointer, detail: says.noSuchAnimal }] })
            if (group.form !== 'group')
              throw new Problem('not-a-group', { errors: [{ pointer, detail: says.notAGroup }] })
            const entryId = parts.ids.next()
            await forLine(index, () =>
              animals.service.changeCount(tx, {
                id: entryId,
                animalId: line.animalId,
                kind: given.kind,
                count: line.count,
                happenedAt: placed.at,
                isFact: head.stage === 'already',
                source: { kind: 'transaction', id: head.id },
              }),
            )
            lines.push({
              ...common,
              accession: group.accession,
              taxonId: group.taxonId,
              accessioned: false,
              enclosureId: group.enclosureId,
              countEntryId: entryId,
            })
          }
        }
        return finish(tx, given, placed, head, lines)
      })
    },

    /** Records that animals left; returns the number of the transaction. */
    recordDisposition(context: RequestContext, given: DispositionGiven): Promise<string> {
      return parts.transactions.inTransaction(context, async (tx) => {
        const begun = await begin(tx, given, 'out')
        if ('repeated' in begun) return begun.repeated
        const { head, placed } = begun
        const at = new Date(placed.at)
        const lines: (TransactionLine & { accession: string; taxonId: string })[] = []
        for (const { line, index } of inLockOrder(given.lines)) {
          const [animal] = await animals.questions.animalsById([line.animalId], at, tx.manager)
          if (!animal)
            throw new Problem('not-found', {
              errors: [{ pointer: `/lines/${String(index)}/animalId`, detail: says.noSuchAnimal }],
            })
          const waits = await forLine(index, () =>
            checkResidues(parts, tx, { animal, kind: given.kind, on: placed.first, stage: head.stage }),
          )
          const entryId = parts.ids.next()
          const { postedCount } = await forLine(index, () =>
            animals.service.changeCount(tx, {
              id: entryId,
              animalId: line.animalId,
              kind: given.kind,
              count: line.count,
              happenedAt: placed.at,
              isFact: head.stage === 'already',
              waits,
              source: { kind: 'transaction', id: head.id },
            }),
          )
          lines.push({
            ...blankLine,
            id: line.id,
            transactionId: head.id,
            position: index + 1,
            animalId: line.animalId,
            accession: animal.accession,
            taxonId: animal.taxonId,
            accessioned: false,
            count: line.count,
            enclosureId: animal.enclosureId,
            countEntryId: postedCount > 0 ? entryId : null,
          })
        }
        return finish(tx, given, placed, head, lines)
      })
    },

    /** Voids a transaction and strikes out what it wrote; refused while later records rest on it. */
    async voidTransaction(context: RequestContext, number: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const transaction = await repository.findTransactionByNumber(tx, number)
        if (!transaction) throw new Problem('not-found')
        const lines = await repository.linesOf(tx, transaction.id)
        for (const { line } of inLockOrder(lines))
          if (line.countEntryId !== null) {
            const { strikeAccession, strikeCount } = animals.service
            await (line.accessioned ? strikeAccession : strikeCount)(tx, {
              countEntryId: line.countEntryId,
              reason,
            })
          }
        if (await repository.isVoided(tx, transaction.id)) throw new Problem('already-voided')
        await repository.insertTransactionVoid(tx, {
          id: parts.ids.next(),
          transactionId: transaction.id,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({ action: 'transaction.void', subject: subject(transaction), after: { reason } })
      })
    },
  }
}

export type AcquisitionsService = ReturnType<typeof createAcquisitionsService>
