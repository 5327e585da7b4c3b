import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/observations.contract.ts'
import { checkObservation } from '../../../shared/domain/observations/check-observation.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { observationDetails, observationRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import { sayObservation } from '../../../shared/messages/observations.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { checkMayStrike } from '../animals/index.ts'
import type { AnimalFacts } from '../animals/index.ts'
import type { Enclosures } from '../enclosures/index.ts'
import { stampsOf } from './case-writer.ts'
import type { CaseWriter, CaseWriterParts } from './case-writer.ts'
import * as cases from './cases.repository.ts'
import type { NoticesService } from './notices.service.ts'
import type { ObservationRow } from './observation.entity.ts'
import * as repository from './observations.repository.ts'
import type { UnnamedBodies } from './unnamed-bodies.ts'

type Given = BodyOf<typeof contracts.recordObservation>

/** Forms that are still taken; an older one is taken for 30 days after the next came out. */
const formsTaken = new Set([1])

/** What keepers see. An observation, its deaths, its count, its call for help are one transaction. */
export function createObservationsService(
  parts: CaseWriterParts & {
    transactions: Transactions
    enclosures: Enclosures
    writer: CaseWriter
    notices: NoticesService
    unnamed: UnnamedBodies
  },
) {
  const { animals, writer } = parts

  /** A registrar may flag what they saw; a round with counts and deaths is for those who look after animals. */
  function checkMayRecord(tx: Tx, given: Given): void {
    if (decide('observation.record', tx.actor.roles).allowed) return
    const { lookedAt, feeding, breathing, skin, count, foundDead, unwell, handled } = given
    const isRound =
      lookedAt ||
      feeding !== null ||
      breathing !== null ||
      skin !== null ||
      count !== null ||
      foundDead !== null ||
      unwell !== null ||
      handled !== null
    if (isRound || !(given.forVeterinarian || given.urgent))
      throw new Problem('may-not', { detail: observationDetails.flagOnly })
  }

  function checkShape(given: Given): void {
    if (!formsTaken.has(given.schemaVersion))
      throw new Problem('form-too-old', { detail: observationDetails.oldForm })
    const named = given.deaths.reduce((sum, { count }) => sum + count, 0)
    const checked = checkObservation(given, named)
    if (checked.ok) return
    const { code, field } = checked.refusal
    throw refusedInput(field ? `/${field}` : '', observationRefusals[code], code)
  }

  /** Whose bodies they are, where only one animal or group is there. */
  function deathsOf(
    given: Given,
    here: readonly AnimalFacts[],
  ): { id: string; accession: string; count: number }[] {
    const [only] = here
    if (given.deaths.length > 0 || here.length !== 1 || !only || !given.foundDead) return given.deaths
    return [{ id: parts.ids.next(), accession: only.accession, count: given.foundDead }]
  }

  async function postCount(tx: Tx, given: Given, here: readonly AnimalFacts[], at: string): Promise<void> {
    const [only] = here
    const { count } = given
    if (!count || count.basis === 'not-counted' || here.length !== 1 || only?.form !== 'group') return
    await animals.service.postCount(tx, only.accession, {
      id: parts.ids.next(),
      basis: count.basis,
      low: count.low,
      high: count.high,
      happenedAt: at,
    })
  }

  return {
    /**
     * Keeps an observation. The facts in it go where facts of their kind go: deaths and counts into the ledgers of
     * animals, bodies that nobody could name into the clocks of the cases there, an urgent call to whoever is on call.
     */
    async record(context: RequestContext, given: Given): Promise<void> {
      checkShape(given)
      await parts.transactions.inTransaction(context, async (tx) => {
        checkMayRecord(tx, given)
        const enclosure = await parts.enclosures.questions.byCode(given.enclosure, tx.manager)
        if (!enclosure) throw refusedInput('/enclosure', observationDetails.noSuchEnclosure, 'not-found')
        const times = await writer.timesOf(tx, given)
        const here = await animals.questions.animalsIn([enclosure.id], times.happenedAt, tx.manager)
        const heads = await casesThere(tx, here, times.happenedAt)
        // A look changes no clock unless bodies are found: only then it matters whose they may be
        const mayBeOf = given.foundDead
          ? await parts.unnamed.casesFor(tx, enclosure.id, times.happenedAt)
          : []
        const leftBefore = mayBeOf.filter(({ id }) => heads.every((head) => head.id !== id))
        const deaths = leftBefore.length > 0 ? given.deaths : deathsOf(given, here)
        const named = deaths.reduce((sum, { count }) => sum + count, 0)
        const { count } = given
        const row: ObservationRow = {
          id: given.id,
          enclosureId: enclosure.id,
          schemaVersion: given.schemaVersion,
          origin: given.origin,
          device: given.device,
          saidAt: new Date(given.happenedAt),
          timeDoubtful: times.doubtful,
          lookedAt: given.lookedAt,
          feeding: given.feeding,
          breathing: given.breathing,
          skin: given.skin,
          signs: given.signs,
          words: given.words?.trim() || null,
          countBasis: count?.basis ?? null,
          countLow: count && count.basis !== 'not-counted' ? count.low : null,
          countHigh: count && count.basis !== 'not-counted' ? count.high : null,
          foundDead: given.foundDead,
          unwell: given.unwell,
          handled: given.handled,
          unassignedDead: (given.foundDead ?? 0) - named,
          forVeterinarian: given.forVeterinarian,
          urgent: given.urgent,
          ...stampsOf(times),
        }
        if (await repository.isObservationRepeated(tx, row)) return

        const [first] = heads
        const locked =
          (given.foundDead ?? 0) > 0
            ? await writer.lockAll(
                tx,
                [...heads, ...leftBefore].map(({ id }) => id),
                here.map(({ animalId }) => animalId),
              )
            : []
        await repository.insertObservation(
          tx,
          row,
          heads.map(({ id }) => id),
        )
        const at = times.happenedAt.toISOString()
        for (const death of deaths) {
          await animals.service.postDeaths(tx, death.accession, {
            ...death,
            kind: 'found-dead',
            enclosureId: enclosure.id,
            happenedAt: at,
          })
          await repository.linkDeath(tx, given.id, death.id)
        }
        await postCount(tx, given, here, at)
        const { origin, device } = given
        const unnamed = { count: row.unassignedDead, observationId: given.id, origin, device }
        await parts.unnamed.enter(tx, locked, unnamed, stampsOf(times))
        await parts.unnamed.enterNamedElsewhere(tx, locked, deaths, unnamed, stampsOf(times))
        const words = sayObservation(given).join('. ')
        tx.audit({
          action: 'observation.record',
          subject: { kind: 'enclosure', id: enclosure.id, label: enclosure.code },
          after: {
            id: given.id,
            words,
            happenedAt: at,
            forVeterinarian: given.forVeterinarian,
            urgent: given.urgent,
            cases: [...heads, ...leftBefore].map(({ number }) => number),
          },
          clinical: true,
        })
        if (given.urgent)
          await parts.notices.raise(tx, {
            id: given.noticeId ?? parts.ids.next(),
            observationId: given.id,
            enclosureId: enclosure.id,
            caseNumber: first?.number ?? null,
            words,
            times: stampsOf(times),
          })
      })
    },

    /** A veterinarian has read it. */
    async review(
      context: RequestContext,
      id: string,
      given: { id: string; words?: string | undefined },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        if (!(await repository.findObservation(tx, id))) throw new Problem('not-found')
        const { created } = await repository.insertReview(tx, {
          id: given.id,
          observationId: id,
          words: given.words || null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (created)
          tx.audit({
            action: 'observation.review',
            subject: { kind: 'observation', id, label: id },
            after: { words: given.words },
            clinical: true,
          })
      })
    },

    /**
     * Strikes out an observation; whoever made it, or a veterinarian. Bodies without a name leave every clock that they
     * stood in; the death of a named animal is a record of its own and is struck out there.
     */
    async strike(context: RequestContext, id: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = await repository.findObservation(tx, id)
        if (!row) throw new Problem('not-found')
        const own = row.recordedBy !== null && row.recordedBy === tx.actor.personId
        if (!own && !decide('chart.write', tx.actor.roles).allowed)
          throw new Problem('may-not', { detail: observationDetails.ownOrVet })
        const heads = await parts.unnamed.lock(tx, id)
        // the clocks rest on its bodies: they are taken out by whoever may strike out a death
        if (heads.length > 0) await checkMayStrike(parts, tx, 'death.strike', row)
        await repository.insertVoid(tx, {
          id: parts.ids.next(),
          observationId: id,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'observation.strike',
          subject: { kind: 'observation', id, label: id },
          after: { reason },
          clinical: true,
        })
        await parts.unnamed.withdraw(tx, heads, { observationId: id, reason })
        if (heads.length > 0) await writer.settle(tx, ...heads.map((head) => head.id))
      })
    },
  }

  /** The cases that the animals in an enclosure belonged to at an instant. */
  async function casesThere(tx: Tx, here: readonly AnimalFacts[], at: Date) {
    const found = new Map<string, { id: string; number: string }>()
    for (const { animalId } of here) {
      const head = await cases.findCaseOf(tx, animalId, at)
      if (head) found.set(head.id, head)
    }
    return [...found.values()].sort((a, b) => (a.id < b.id ? -1 : 1))
  }
}

export type ObservationsService = ReturnType<typeof createObservationsService>
