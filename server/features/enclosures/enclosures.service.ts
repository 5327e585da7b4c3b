import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/enclosures.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { hasWater } from '../../../shared/domain/places/enclosure-kind.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { enclosureDetails } from '../../../shared/messages/enclosures.ts'
import type { Ids } from '../../platform/ids.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { timeNotAhead } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import * as repository from './enclosures.repository.ts'
import type { EnclosureDescription } from './enclosures.repository.ts'

type Entered = BodyOf<typeof contracts.enterEnclosure>
type Described = Omit<Entered, 'id' | 'code' | 'inUseFrom'>

const subject = (row: { id: string; code: string }) => ({ kind: 'enclosure', id: row.id, label: row.code })
const bodySubject = (row: { id: string; code: string }) => ({
  kind: 'water-body',
  id: row.id,
  label: row.code,
})

/** Who may only propose may not describe places: there is nothing yet that takes such a proposal up. */
function checkMayConfigure(tx: Tx): void {
  const { allowed } = decide('water.configure', tx.actor.roles, { 'proposal-only': false })
  if (!allowed && tx.actor.personId !== null)
    throw new Problem('may-not', { detail: enclosureDetails.onlyPropose })
}

/** What somebody wrote about an enclosure, as its row; refuses a vessel without a mark and a mark without a vessel. */
function descriptionOf(given: Described): EnclosureDescription {
  const { fillMark, treatmentVessel, kind } = given
  if (treatmentVessel && !hasWater(kind))
    throw refusedInput('/treatmentVessel', enclosureDetails.landIsNoVessel, 'land-is-no-vessel')
  if (treatmentVessel && !fillMark)
    throw refusedInput('/fillMark', enclosureDetails.fillMarkNeeded, 'fill-mark-needed')
  if (!treatmentVessel && fillMark)
    throw refusedInput('/fillMark', enclosureDetails.fillMarkOnlyOnVessel, 'fill-mark-only-on-vessel')
  const litres = fillMark
    ? parseQuantity(fillMark.volume, { dimension: 'volume', above: 0, max: 100_000 })
    : null
  if (litres && !litres.ok)
    throw refusedInput(
      '/fillMark/volume',
      sayNumberRefusal(litres.refusal, enclosureDetails.fillMarkField),
      litres.refusal.code,
    )
  const marked = litres?.ok ? litres.value : null
  return {
    name: given.name,
    kind,
    area: given.area,
    boundary: given.boundary,
    airSpace: given.airSpace,
    treatmentVessel,
    fillMark: fillMark?.mark ?? null,
    fillMarkEnteredValue: marked?.entered.value ?? null,
    fillMarkEnteredUnit: marked?.entered.unit ?? null,
    fillMarkLitres: marked?.value ?? null,
    description: given.description,
  }
}

export function createEnclosuresService(parts: { transactions: Transactions; ids: Ids }) {
  return {
    /** Enters an enclosure; one that has water gets a body of the same code, in the same transaction. */
    async enterEnclosure(context: RequestContext, given: Entered): Promise<void> {
      const description = descriptionOf(given)
      await parts.transactions.inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        const inUseFrom = given.inUseFrom ? timeNotAhead(given.inUseFrom, tx.at, '/inUseFrom') : tx.at
        const stamps = {
          inUseFrom,
          inUseUntil: null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const row = { id: given.id, code: given.code, ...description, ...stamps }
        const { created } = await repository.insertEnclosure(tx, row)
        if (!created) return
        if (hasWater(given.kind))
          await repository.insertWaterBody(tx, {
            id: parts.ids.next(),
            code: given.code,
            name: given.name,
            kind: 'enclosure',
            enclosureId: given.id,
            ...stamps,
          })
        tx.audit({
          action: 'enclosure.enter',
          subject: subject(row),
          after: { code: row.code, ...description },
        })
      })
    },

    /** Corrects the description. A tank never becomes a land area, nor the other way: their water differs. */
    async correctEnclosure(
      context: RequestContext,
      code: string,
      given: Described & { expectedVersion: number },
    ): Promise<void> {
      const description = descriptionOf(given)
      await parts.transactions.inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        const before = await repository.lockEnclosure(tx, code)
        if (!before) throw new Problem('not-found')
        if (hasWater(before.kind) !== hasWater(given.kind))
          throw new Problem('kind-has-no-water', { detail: enclosureDetails.kindKeepsWater })
        await repository.saveEnclosure(tx, { id: before.id, version: given.expectedVersion }, description)
        const { name, kind, area, boundary, airSpace, treatmentVessel, fillMarkLitres } = before
        tx.audit({
          action: 'enclosure.correct',
          subject: subject(before),
          before: { name, kind, area, boundary, airSpace, treatmentVessel, fillMarkLitres },
          after: { ...description },
        })
      })
    },

    /** Enters a sump or a loop. */
    async enterWaterBody(
      context: RequestContext,
      given: BodyOf<typeof contracts.enterWaterBody>,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        const row = {
          id: given.id,
          code: given.code,
          name: given.name,
          kind: given.kind,
          enclosureId: null,
          inUseFrom: given.inUseFrom ? timeNotAhead(given.inUseFrom, tx.at, '/inUseFrom') : tx.at,
          inUseUntil: null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const { created } = await repository.insertWaterBody(tx, row)
        if (created)
          tx.audit({
            action: 'water-body.enter',
            subject: bodySubject(row),
            after: { name: row.name, kind: row.kind },
          })
      })
    },

    /** Renames a sump or loop, or takes it out of use. */
    async correctWaterBody(
      context: RequestContext,
      id: string,
      given: BodyOf<typeof contracts.correctWaterBody>,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        checkMayConfigure(tx)
        const [before] = await repository.lockWaterBodies(tx, [id])
        if (!before) throw new Problem('not-found')
        if (before.kind === 'enclosure') throw new Problem('belongs-to-enclosure')
        const inUseUntil = given.inUseUntil ? timeNotAhead(given.inUseUntil, tx.at, '/inUseUntil') : null
        await repository.saveWaterBody(
          tx,
          { id, version: given.expectedVersion },
          { name: given.name, inUseUntil },
        )
        tx.audit({
          action: 'water-body.correct',
          subject: bodySubject(before),
          before: { name: before.name, inUseUntil: before.inUseUntil?.toISOString() ?? null },
          after: { name: given.name, inUseUntil: inUseUntil?.toISOString() ?? null },
        })
      })
    },

    checkMayConfigure,
    lockWaterBodies: repository.lockWaterBodies,
  }
}

export type EnclosuresService = ReturnType<typeof createEnclosuresService>
