import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type { clearCase } from '../../../shared/contracts/clearance.contract.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import type { CaseClock, UnmetCriterion } from '../../../shared/domain/quarantine/case-clock.ts'
import { judgeClearance } from '../../../shared/domain/quarantine/judge-clearance.ts'
import { clearanceWords } from '../../../shared/messages/clearance.ts'
import { quarantineRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { sayUnmet } from '../../../shared/messages/say-unmet.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { SigningService } from '../signing/index.ts'
import type { CaseWriter, CaseWriterParts, LockedCase } from './case-writer.ts'
import { batchOf, clockOf, presentNames } from './cases.present.ts'
import { writeClearance } from './clearance-content.ts'
import { protocolInForce } from './protocol-in-force.ts'
import { readProtocolVersions } from './protocols.reads.ts'

type Given = BodyOf<typeof clearCase>

const codesOf = (unmet: readonly Pick<UnmetCriterion, 'code'>[]) => unmet.map(({ code }) => code).sort()

/** The signed end of quarantine. */
export function createClearanceService(
  parts: CaseWriterParts & { transactions: Transactions; writer: CaseWriter; signing: SigningService },
) {
  const { animals, writer } = parts

  /** What the signer read is what is signed: anything that came between has to be read first. */
  function checkSeen(clock: CaseClock, given: Given): void {
    const seen = [...given.expectedUnmet].sort()
    const now = codesOf(clock.unmet)
    const dateMoved =
      given.expectedEarliestOn !== undefined && given.expectedEarliestOn !== clock.earliestClearanceOn
    if (seen.join(' ') !== now.join(' ') || dateMoved)
      throw new Problem('stale-version', {
        detail: quarantineRefusals.unmetChanged,
        extra: { unmet: now, earliestClearanceOn: clock.earliestClearanceOn },
      })
  }

  function checkConditions({ facts, head }: LockedCase, clock: CaseClock, given: Given): void {
    const { verdict, refusedBy } = judgeClearance(clock)
    if (verdict === 'refused') {
      const names = presentNames(facts, [head])
      const words = {
        date: sayDate,
        caseName: (id: string) => names.cases[id] ?? id,
        criterionName: (id: string) => names.criteria[id] ?? id,
      }
      throw new Problem('not-clearable', {
        detail: quarantineRefusals.notClearable({
          why: refusedBy.map((unmet) => sayUnmet(unmet, words)).join(' '),
        }),
        extra: { unmet: codesOf(refusedBy) },
      })
    }
    if (verdict === 'with-reason' && given.reason === undefined)
      throw new Problem('reason-needed', {
        detail: quarantineRefusals.reasonNeeded,
        errors: [{ pointer: '/reason', detail: quarantineRefusals.reasonNeeded, code: 'reason-needed' }],
      })
  }

  async function isConfirmed(tx: Tx, versionId: string): Promise<boolean> {
    const [version] = await readProtocolVersions(tx.manager, { id: versionId })
    return version?.confirmed_at != null
  }

  return {
    /**
     * Clears a batch: the clock is computed again from what is stored, under a lock of every case on that water.
     *
     * @refuses licence-not-valid | password-wrong | sign-in-locked | not-found | case-ended | stale-version |
     * not-clearable | discrepancy-open | reason-needed
     */
    async clear(context: RequestContext, number: string, given: Given, now: Date): Promise<void> {
      const { password, licenceId } = given
      const signatory = await parts.signing.confirmSignatory(context, 'case.clear', password, now, {
        licenceId,
      })
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const { facts, head } = locked
        writer.checkRuns(locked, tx.at)
        const clock = clockOf(facts, head)
        checkSeen(clock, given)
        checkConditions(locked, clock, given)
        const batch = batchOf(facts, head).map(({ animal_id }) => animal_id)
        if ((await animals.questions.openDiscrepanciesOf(batch, tx.manager)).length > 0)
          throw new Problem('discrepancy-open', { detail: quarantineRefusals.discrepancies })

        const times = await parts.facility.timesOf(tx, tx.at.toISOString(), '/happenedAt')
        const eventId = parts.ids.next()
        const reason = given.reason ?? null
        const content = writeClearance({
          facts,
          head,
          animals: await animals.questions.animalsById(batch, tx.at, tx.manager),
          protocolConfirmed: await isConfirmed(tx, protocolInForce(facts, head).versionId),
          eventId,
          clearedOn: times.happenedOn,
          reason,
        })
        const sealed = await parts.signing.seal(tx, {
          signatory,
          subject: { kind: 'case', id: head.id, label: head.number },
          meaning: clearanceWords.meaning,
          content: JSON.parse(JSON.stringify(content)) as Json,
        })
        await writer.write(
          tx,
          head,
          { id: eventId, facts: { kind: 'cleared' }, reason, signedTextId: sealed.id },
          times,
        )
        await writer.settle(tx, head.id)
      })
    },
  }
}

export type ClearanceService = ReturnType<typeof createClearanceService>
