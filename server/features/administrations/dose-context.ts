import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { orderProblemWords } from '../../../shared/messages/orders.ts'
import { sayDoNotDose } from '../../../shared/messages/record-fault.ts'
import { permissionWords } from '../../../shared/messages/permissions.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FacilityService } from '../facility/index.ts'
import * as repository from './administrations.repository.ts'
import { readDoseSituation } from './dose-situation.ts'
import type { DoseSituation, DoseSituationParts } from './dose-situation.ts'
import type { Calculations } from './second-person.ts'

export interface AdministrationsParts extends DoseSituationParts {
  transactions: Transactions
  clock: Clock
  facility: FacilityService
  calculations(of: Pick<DoseSituation, 'row' | 'versionId' | 'planned'>, tx: Tx): Promise<Calculations>
  ids: Ids
}

/** The order as the audit trail names it. */
export const subjectOf = ({ row }: DoseSituation) => ({ kind: 'order', id: row.id, label: row.number })

export function personOf(tx: Tx): string {
  if (tx.actor.personId === null) throw new Problem('not-signed-in')
  return tx.actor.personId
}

/** No dose is prepared from an order that is not what was signed. */
export function refuseBroken({ block }: DoseSituation): void {
  if (block.state !== 'intact') throw new Problem('broken-record', { detail: sayDoNotDose(block.fault) })
}

/** The signed version that a dose is prepared under; nothing is prepared where there is none any more. */
export function versionOf({ versionId }: DoseSituation): string {
  if (versionId === null) throw new Problem('broken-record', { detail: orderProblemWords.versionGone })
  return versionId
}

const yearMs = 366 * 24 * 3_600_000

/** A dose of an order cannot be of years before it: the year was mistyped. Nearer, it happened, and is kept and marked. */
export function refuseLongBefore({ block, judgement }: DoseSituation, happenedAt: Date): void {
  if (Date.parse(block.signedAt) - happenedAt.getTime() <= yearMs) return
  const signedAt = sayInstant(block.signedAt, judgement?.facts.zone ?? block.zone)
  throw refusedInput('/happenedAt', doseWords.longBeforeOrder({ signedAt }), 'before-its-order')
}

/** A bath is given by a veterinarian or technician; what an order opens to keepers is feed and topical. */
export function refuseGiver(context: RequestContext): void {
  if (!decide('dose.give', context.actor.roles, {}).allowed)
    throw new Problem('may-not', {
      detail: permissionWords.whoMay({
        roles: rolesThatMay('dose.give').filter((role) => decide('dose.give', [role], {}).allowed),
      }),
    })
}

/** One dose as it stands at an instant, with its order locked: people at one tank are judged one after the other. */
export async function lockAndRead(
  parts: DoseSituationParts,
  tx: Tx,
  dose: { number: string; key: string; at: Date; lotId?: string | null },
): Promise<DoseSituation> {
  if ((await repository.lockOrderHead(tx, dose.number)) === null) throw new Problem('not-found')
  return readDoseSituation(parts, dose.number, dose.key, dose.at, {
    db: tx.manager,
    ...(dose.lotId === undefined ? {} : { lotId: dose.lotId }),
  })
}
