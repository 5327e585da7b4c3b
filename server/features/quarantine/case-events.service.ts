import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/case-events.contract.ts'
import type { EventOf } from '../../../shared/domain/quarantine/clock-event.ts'
import { quarantineRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { SigningService } from '../signing/index.ts'
import type { CaseEventFacts } from './case-event-facts.ts'
import { isLive } from './read-clocks.ts'
import { stampsOf } from './case-writer.ts'
import type { CaseWriter, CaseWriterParts, EventGiven, LockedCase } from './case-writer.ts'
import * as repository from './cases.repository.ts'
import { protocolContentOf } from './protocol-in-force.ts'
import { findProtocolCode, findProtocolVersion } from './protocols.repository.ts'

type Body<C> = BodyOf<C>

/** What is reported, decided, found and held in a case: each is one event for its clock. */
export function createCaseEventsService(
  parts: CaseWriterParts & {
    transactions: Transactions
    writer: CaseWriter
    signing: SigningService
  },
) {
  const { writer } = parts

  /** One event in a transaction of its own; `check` looks at the locked case first. */
  async function enter(
    context: RequestContext,
    number: string,
    given: EventGiven & { happenedAt: string },
    check: (locked: LockedCase, tx: Tx) => Promise<void> | void = () => undefined,
  ): Promise<void> {
    await parts.transactions.inTransaction(context, async (tx) => {
      const locked = await writer.lock(tx, number)
      const times = await writer.timesOf(tx, {
        happenedAt: given.happenedAt,
        origin: given.origin ?? 'online',
      })
      if (!(await repository.findEvent(tx, given.id))) {
        writer.checkRuns(locked, times.happenedAt)
        await check(locked, tx)
      }
      await writer.write(tx, locked.head, given, times)
      await writer.settle(tx, locked.head.id)
    })
  }

  const ofCase = ({ facts, head }: LockedCase) =>
    facts.events.filter((row) => row.case_id === head.id && isLive(row))

  return {
    async report(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.reportEvent>,
    ): Promise<void> {
      const { event } = given
      const facts: CaseEventFacts =
        event.kind === 'addition'
          ? { ...event, quarantineKind: null }
          : event.kind === 'pause-started'
            ? { ...event, pauseId: given.id }
            : event
      const reason = given.note ?? null
      await enter(
        context,
        number,
        { id: given.id, happenedAt: given.happenedAt, facts, reason },
        (locked) => {
          if (event.kind !== 'pause-ended') return
          const begun = ofCase(locked).find(
            (row) =>
              row.kind === 'pause-started' &&
              (row.facts as EventOf<'pause-started'>).pauseId === event.pauseId,
          )
          if (!begun) throw refusedInput('/event/pauseId', quarantineRefusals.noSuchEvent, 'not-found')
          if (new Date(given.happenedAt) < begun.happened_at)
            throw new Problem('period-reversed', {
              detail: quarantineRefusals.pauseEndsBefore,
              errors: [
                {
                  pointer: '/happenedAt',
                  detail: quarantineRefusals.pauseEndsBefore,
                  code: 'period-reversed',
                },
              ],
            })
        },
      )
    },

    async decide(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.decideEvent>,
    ): Promise<void> {
      const { decision, id, happenedAt, reason } = given
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const times = await writer.timesOf(tx, { happenedAt })
        const facts = await factsOfDecision(tx, decision)
        if (!(await repository.findEvent(tx, id))) {
          if (decision.kind !== 'voided') writer.checkRuns(locked, times.happenedAt)
          checkDecision(locked, decision)
        }
        await writer.write(tx, locked.head, { id, facts, reason }, times)
        await writer.settle(tx, locked.head.id)
      })
    },

    async enterResult(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.enterResult>,
    ): Promise<void> {
      const { id, happenedAt, takenAt, testKey, result, pathogenName, pathogenStatus } = given
      if (new Date(takenAt) > new Date(happenedAt))
        throw new Problem('period-reversed', {
          detail: quarantineRefusals.takenAfterReport,
          errors: [
            { pointer: '/takenAt', detail: quarantineRefusals.takenAfterReport, code: 'period-reversed' },
          ],
        })
      if (result === 'positive' && (pathogenName === undefined || pathogenStatus === undefined))
        throw refusedInput('/pathogenName', quarantineRefusals.pathogenMissing, 'pathogen-missing')
      const facts: CaseEventFacts = {
        kind: 'sample-result',
        sampleId: id,
        testKey,
        takenAt: new Date(takenAt).toISOString(),
        result,
        ...(pathogenName === undefined ? {} : { pathogenName }),
        ...(pathogenStatus === undefined ? {} : { pathogenStatus }),
      }
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const times = await writer.timesOf(tx, { happenedAt })
        const content = protocolContentOf(locked.facts, locked.head)
        if (!content.testNames[testKey])
          throw refusedInput('/testKey', quarantineRefusals.noSuchTest, 'not-found')
        // A result after clearance is taken: a positive recalls the case
        await writer.write(tx, locked.head, { id, facts, reason: given.note ?? null }, times)
        await writer.settle(tx, locked.head.id)
      })
    },

    async recordStep(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.recordStep>,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const times = await writer.timesOf(tx, given)
        writer.checkRuns(locked, times.happenedAt)
        const step = protocolContentOf(locked.facts, locked.head).steps.find(
          ({ key, daily }) => key === given.stepKey && !daily,
        )
        if (!step) throw refusedInput('/stepKey', quarantineRefusals.noSuchStep, 'not-found')
        const { created } = await repository.insertStepRecord(tx, {
          id: given.id,
          caseId: locked.head.id,
          stepKey: given.stepKey,
          outcome: given.outcome,
          note: given.note ?? null,
          ...stampsOf(times),
        })
        if (created)
          tx.audit({
            action: 'case.record-step',
            subject: { kind: 'case', id: locked.head.id, label: number },
            after: { step: step.name, outcome: given.outcome, note: given.note },
            clinical: true,
          })
      })
    },

    /** Stopping is never gated: no password, no reason, and one more hold on a held case is no fault. */
    async hold(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.holdCase>,
    ): Promise<void> {
      const { id, happenedAt, origin, device } = given
      await enter(context, number, {
        id,
        happenedAt,
        origin,
        device,
        facts: { kind: 'locked', cause: 'held' },
        reason: given.reason ?? null,
      })
    },

    async lock(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.lockCase>,
    ): Promise<void> {
      const { id, happenedAt, cause, reason } = given
      await enter(context, number, { id, happenedAt, facts: { kind: 'locked', cause }, reason })
    },

    async lift(
      context: RequestContext,
      number: string,
      given: Body<typeof contracts.liftLock>,
    ): Promise<void> {
      const { id, happenedAt, lockEventId, reason } = given
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const times = await writer.timesOf(tx, { happenedAt })
        const clock = locked.facts.clocks.get(locked.head.id)
        const standing = clock?.locks.find((one) => one.eventId === lockEventId && one.liftedAt === null)
        if (!(await repository.findEvent(tx, id)) && !standing)
          throw new Problem('not-locked', { detail: quarantineRefusals.notLocked })
        await writer.write(tx, locked.head, { id, facts: { kind: 'unlocked', lockEventId }, reason }, times)
        await writer.settle(tx, locked.head.id)
      })
    },

    /** Signs the cause of a death. The signed text stands beside the event; a later signature follows it. */
    async signDeathCause(
      context: RequestContext,
      number: string,
      deathId: string,
      given: Body<typeof contracts.signDeathCause>,
      now: Date,
    ): Promise<void> {
      const { password, licenceId } = given
      const signatory = await parts.signing.confirmSignatory(context, 'necropsy.sign', password, now, {
        licenceId,
      })
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const { head, facts } = locked
        const death = facts.deaths.find((row) => row.case_id === head.id && row.id === deathId)
        const reported = ofCase(locked).find((row) => row.kind === 'death' && row.id === deathId)
        const found = death ?? reported
        if (!found) throw new Problem('not-found', { detail: quarantineRefusals.noSuchEvent })
        const { finding, cause } = given
        const sealed = await parts.signing.seal(tx, {
          signatory,
          subject: { kind: 'case', id: head.id, label: head.number },
          meaning: 'cause of a death',
          content: {
            case: head.number,
            death: { id: deathId, on: found.happened_on },
            finding,
            cause,
          },
        })
        const times = await writer.timesOf(tx, { happenedAt: tx.at.toISOString() })
        await writer.write(
          tx,
          head,
          {
            id: parts.ids.next(),
            facts: { kind: 'death-cause-signed', deathEventId: deathId, finding, cause },
            signedTextId: sealed.id,
          },
          times,
        )
        await writer.settle(tx, head.id)
      })
    },

    /**
     * For other features, in their transaction: something that happened to a case (a treatment that began or ended).
     * The id makes a repetition harmless.
     */
    async recordEvent(
      tx: Tx,
      given: { id: string; caseNumber: string; facts: CaseEventFacts; happenedAt: string; reason?: string },
    ): Promise<void> {
      const locked = await writer.lock(tx, given.caseNumber)
      const times = await writer.timesOf(tx, given)
      await writer.write(tx, locked.head, { ...given, reason: given.reason ?? null }, times)
      await writer.settle(tx, locked.head.id)
    },
  }

  async function factsOfDecision(
    tx: Tx,
    decision: Body<typeof contracts.decideEvent>['decision'],
  ): Promise<CaseEventFacts> {
    if (decision.kind !== 'protocol-changed') return decision
    const version = await findProtocolVersion(tx, decision.protocolVersionId)
    if (!version)
      throw refusedInput('/decision/protocolVersionId', quarantineRefusals.noSuchProtocol, 'not-found')
    const { name, content } = version
    const protocol = {
      versionId: version.id,
      code: (await findProtocolCode(tx, version.protocolId)) ?? '',
      version: version.version,
      name,
      content,
    }
    return { kind: 'protocol-changed', policy: content.policy, protocol }
  }

  function checkDecision(locked: LockedCase, decision: Body<typeof contracts.decideEvent>['decision']): void {
    const refuse = (name: string, words = quarantineRefusals.noSuchEvent) =>
      refusedInput(`/decision/${name}`, words, 'not-found')
    const { facts, head } = locked
    const clock = facts.clocks.get(head.id)
    if (decision.kind === 'extension-ended') {
      if (
        !clock?.extensions.some(
          (one) => one.eventId === decision.extensionEventId && one.state === 'standing',
        )
      )
        throw refuse('extensionEventId')
    } else if (decision.kind === 'transport-death-extends') {
      if (!facts.deaths.some((row) => row.case_id === head.id && row.id === decision.deathEventId))
        throw refuse('deathEventId')
    } else if (decision.kind === 'criterion-declared') {
      if (!clock?.criteria.some((one) => one.criterionId === decision.criterionId && one.kind === 'declared'))
        throw refuse('criterionId', quarantineRefusals.noSuchCriterion)
    } else if (decision.kind === 'voided') {
      const event = facts.events.find((row) => row.case_id === head.id && row.id === decision.voidsEventId)
      const member = facts.batches.find(
        (row) => row.case_id === head.id && row.member_id === decision.voidsEventId,
      )
      if ((!event && !member) || event?.kind === 'cleared' || event?.kind === 'voided')
        throw refuse('voidsEventId')
      if (event?.voided_reason) throw new Problem('already-void')
    }
  }
}

export type CaseEventsService = ReturnType<typeof createCaseEventsService>
