import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/protocols.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { checkProtocol } from '../../../shared/domain/protocol/check-protocol.ts'
import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import { protocolRefusals, quarantineRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Ids } from '../../platform/ids.ts'
import type { PeopleQuestions } from '../people/index.ts'
import { readProtocolVersions } from './protocols.reads.ts'
import * as repository from './protocols.repository.ts'

type Proposed = BodyOf<typeof contracts.proposeProtocol>

/** Protocols: proposed by anybody who may, in force for new cases once a licensed veterinarian confirmed them. */
export function createProtocolsService(parts: {
  dataSource: Db
  transactions: Transactions
  clock: Clock
  ids: Ids
  people: PeopleQuestions
  /** @refuses sign-in-locked */
  refuseWhileLocked(personId: string): Promise<void>
}) {
  return {
    async propose(context: RequestContext, given: Proposed): Promise<void> {
      const content = given.content as ProtocolContent
      const checked = checkProtocol(content)
      if (!checked.ok) {
        const { code, field = 'content', params } = checked.refusal
        const detail =
          code === 'length-too-short'
            ? quarantineRefusals.shortfall(params as { neededDays: number; requiredDays: number })
            : protocolRefusals[code]
        throw refusedInput(`/content/${field}`, detail, code)
      }
      await parts.transactions.inTransaction(context, async (tx) => {
        if (await repository.isVersionRepeated(tx, { id: given.id, name: given.name, content })) return
        const known = await repository.findProtocol(tx, given.code)
        const protocol = known ?? {
          id: parts.ids.next(),
          code: given.code,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        }
        if (!known) await repository.insertProtocol(tx, protocol)
        const version = await repository.nextVersion(tx, protocol.id)
        await repository.insertVersion(tx, {
          id: given.id,
          protocolId: protocol.id,
          version,
          name: given.name,
          content,
          source: given.source,
          mark: given.mark,
          reason: given.reason,
          proposedAt: tx.at,
          proposedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'protocol.propose',
          subject: { kind: 'protocol', id: protocol.id, label: `${given.code} ${String(version)}` },
          after: { name: given.name, requiredDays: content.policy.requiredDays, reason: given.reason },
        })
      })
    },

    /** A veterinarian with a licence valid today takes the figures on. */
    async confirm(
      context: RequestContext,
      code: string,
      version: number,
      reason: string | undefined,
    ): Promise<string> {
      const [row] = await readProtocolVersions(parts.dataSource, { code, version })
      if (!row) throw new Problem('not-found')
      const { personId } = context.actor
      const licence = personId === null ? null : await parts.people.validLicence(personId, parts.clock.now())
      const decision = decide('formulary.confirm', context.actor.roles, { 'valid-licence': licence !== null })
      if (!decision.allowed || personId === null) throw new Problem('licence-not-valid')
      await parts.refuseWhileLocked(personId)
      await parts.transactions.inTransaction(context, async (tx) => {
        await repository.insertConfirmation(tx, {
          id: parts.ids.next(),
          protocolVersionId: row.id,
          reason: reason ?? null,
          confirmedAt: tx.at,
          confirmedBy: personId,
        })
        tx.audit({
          action: 'protocol.confirm',
          subject: { kind: 'protocol', id: row.id, label: `${code} ${String(version)}` },
          after: { name: row.name, licence: licence?.number ?? '', reason },
        })
      })
      return row.id
    },
  }
}

export type ProtocolsService = ReturnType<typeof createProtocolsService>
