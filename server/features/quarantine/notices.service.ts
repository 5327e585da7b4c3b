import { readOnCall } from '../../../shared/domain/notices/read-on-call.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { noticeLetter } from '../../../shared/messages/notices.ts'
import { observationDetails } from '../../../shared/messages/quarantine-refusals.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { installation } from '../../platform/http/request-context.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import { enqueueJob } from '../../platform/jobs/jobs.ts'
import type { Mail } from '../../platform/mail/mail.ts'
import type { FacilityService, FactTimes } from '../facility/index.ts'
import { readNotices } from './notices.reads.ts'
import type { NoticeReadRow } from './notices.reads.ts'
import * as repository from './notices.repository.ts'

const jobContext: RequestContext = { actor: installation, requestId: 'send-notice' }
const allowedAheadMs = 5 * 60_000

/** Urgent calls: raised with an observation, sent by a job, seen and answered by people. */
export function createNoticesService(parts: {
  dataSource: Db
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  mail: Mail
  /** Where the application is reached, for the letter. */
  publicUrl: string
}) {
  const { transactions, facility } = parts

  async function deliver(notice: NoticeReadRow, to: { name: string; email: string }): Promise<string | null> {
    const place =
      notice.case_number === null
        ? `${notice.enclosure_code} ${notice.enclosure_name}`
        : noticeLetter.placeWithCase({
            enclosure: notice.enclosure_code,
            name: notice.case_name ?? '',
            number: notice.case_number,
          })
    const at = sayInstantWithOffset(notice.happened_at.toISOString(), await facility.zone())
    try {
      await parts.mail.send({
        to: to.email,
        subject: noticeLetter.subject({ place }),
        text: noticeLetter.text({
          place,
          words: notice.words,
          by: notice.recorded_by_name ?? '',
          at,
          address: `${parts.publicUrl}/urgent/${notice.id}`,
        }),
      })
      return null
    } catch (error) {
      return (error as Error).message || 'failed'
    }
  }

  async function noteDelivery(
    notice: NoticeReadRow,
    to: { name: string; address: string },
    error: string | null,
  ): Promise<void> {
    await transactions.inTransaction(jobContext, async (tx) => {
      await repository.insertDelivery(tx, {
        id: parts.ids.next(),
        noticeId: notice.id,
        toName: to.name,
        toAddress: to.address,
        outcome: error === null ? 'sent' : 'failed',
        error: error === null ? null : error.slice(0, 500),
        recordedAt: tx.at,
      })
      tx.audit({
        action: error === null ? 'notice.send' : 'notice.fail',
        subject: { kind: 'notice', id: notice.id, label: notice.enclosure_code },
        after: { to: to.name, error: error ?? undefined },
      })
    })
  }

  async function act(
    context: RequestContext,
    noticeId: string,
    given: { id: string; kind: 'seen' | 'telephoned'; whom: string | null; happenedAt: string | null },
  ): Promise<void> {
    await transactions.inTransaction(context, async (tx) => {
      const notice = await repository.findNotice(tx, noticeId)
      if (!notice) throw new Problem('not-found')
      const { personId, roles } = tx.actor
      const another = personId !== notice.recordedBy
      if (given.kind === 'seen' && !decide('notice.see', roles, { 'another-person': another }).allowed)
        throw new Problem('another-person-needed', { detail: observationDetails.seenByAnother })
      const said = given.happenedAt === null ? tx.at : new Date(given.happenedAt)
      // A telephone call may have waited on a phone without a signal, whose clock may be wrong
      const happenedAt = said.getTime() > tx.at.getTime() + allowedAheadMs ? tx.at : said
      const { created } = await repository.insertAct(tx, {
        id: given.id,
        noticeId,
        kind: given.kind,
        whom: given.whom,
        happenedAt,
        recordedAt: tx.at,
        recordedBy: tx.actor.personId,
      })
      if (created)
        tx.audit({
          action: `notice.${given.kind}`,
          subject: { kind: 'notice', id: noticeId, label: noticeId },
          after: { whom: given.whom ?? undefined },
        })
    })
  }

  return {
    /** Raises a call in the transaction of its observation; the job goes with the commit. */
    async raise(
      tx: Tx,
      given: {
        id: string
        observationId: string
        enclosureId: string
        caseNumber: string | null
        words: string
        times: FactTimes
      },
    ): Promise<void> {
      const { times, ...row } = given
      await repository.insertNotice(tx, { ...row, ...times })
      await enqueueJob(tx, 'send-notice', given.id)
    },

    /**
     * The job: mails whoever is on call and was not yet reached. May run twice. Fails, to be tried again, while somebody
     * could not be reached and nobody has seen the call.
     */
    async send({ id }: { id: string }): Promise<void> {
      const [notice] = await readNotices(parts.dataSource, { id })
      if (!notice || notice.acts.some(({ kind }) => kind === 'seen')) return
      const listed = readOnCall(await facility.valueOf('notices.on-call')).flatMap(({ name, email }) =>
        email === null ? [] : [{ name, email }],
      )
      if (listed.length === 0) {
        const error = noticeLetter.nobodyListed
        await noteDelivery(notice, { name: '', address: '' }, error)
        throw new Error(error)
      }
      const reached = new Set(
        notice.deliveries.filter(({ outcome }) => outcome === 'sent').map(({ address }) => address),
      )
      const errors: string[] = []
      for (const to of listed.filter(({ email }) => !reached.has(email))) {
        const error = await deliver(notice, to)
        await noteDelivery(notice, { name: to.name, address: to.email }, error)
        if (error !== null) errors.push(`${to.name}: ${error}`)
      }
      if (errors.length > 0) throw new Error(errors.join('; '))
    },

    noteSeen: (context: RequestContext, noticeId: string, id: string) =>
      act(context, noticeId, { id, kind: 'seen', whom: null, happenedAt: null }),

    noteTelephoned: (
      context: RequestContext,
      noticeId: string,
      given: { id: string; whom?: string | undefined; happenedAt: string },
    ) =>
      act(context, noticeId, {
        id: given.id,
        kind: 'telephoned',
        whom: given.whom || null,
        happenedAt: given.happenedAt,
      }),
  }
}

export type NoticesService = ReturnType<typeof createNoticesService>
