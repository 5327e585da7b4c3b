import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/water.contract.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { checkRange } from '../../../shared/domain/readings/check-range.ts'
import type { RangeRefusal } from '../../../shared/domain/readings/check-range.ts'
import { checkReading } from '../../../shared/domain/readings/check-reading.ts'
import type { ReadingRefusal } from '../../../shared/domain/readings/check-reading.ts'
import { canonicalUnitsOf } from '../../../shared/domain/readings/read-parameter-value.ts'
import { rangeLimits } from '../../../shared/domain/readings/water-range.ts'
import type { Refusal } from '../../../shared/domain/result.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import type { NumberRefusalCode } from '../../../shared/messages/say-number-refusal.ts'
import { parameterNames, readingRefusals, waterDetails } from '../../../shared/messages/water.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { EnclosuresService, EnclosureQuestions } from '../enclosures/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { recordedStamps } from './recorded-stamps.ts'
import * as repository from './water.repository.ts'
import type { VoidableKind } from './water.repository.ts'

export interface WaterServiceParts {
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  enclosures: { service: EnclosuresService; questions: EnclosureQuestions }
}

/** The words for a refusal of a reading or range. */
function sayRefusal(refusal: Refusal<ReadingRefusal | RangeRefusal>, label: string): string {
  const { code } = refusal
  return isNumberRefusalCode(code)
    ? sayNumberRefusal(refusal as Refusal<NumberRefusalCode>, label)
    : readingRefusals[code]
}

/** The body, locked; refused when there is none. */
export async function bodyOf(tx: Tx, parts: WaterServiceParts, id: string) {
  const [body] = await parts.enclosures.service.lockWaterBodies(tx, [id])
  if (!body) throw new Problem('not-found', { detail: waterDetails.bodyNotHere })
  return body
}

/** Readings, ranges and water events, and the striking through of wrong records. */
export function createMeasurementsService(parts: WaterServiceParts) {
  const { facility } = parts
  const inTransaction = parts.transactions.inTransaction.bind(parts.transactions)

  return {
    /** Records what was measured in one water at one time: all of it, or nothing. */
    async recordReadings(
      context: RequestContext,
      given: BodyOf<typeof contracts.recordReadings>,
    ): Promise<void> {
      const checked = given.readings.map((reading) => ({ reading, result: checkReading(reading) }))
      const errors = checked.flatMap(({ reading, result }, index) => {
        if (result.ok) return []
        const { code, field } = result.refusal
        const pointer = `/readings/${String(index)}/${field ?? 'value'}`
        return [{ pointer, detail: sayRefusal(result.refusal, parameterNames[reading.parameter]), code }]
      })
      if (errors.length > 0)
        throw new Problem('bad-input', {
          errors,
          detail: errors
            .map((error) => error.detail)
            .slice(0, 3)
            .join(' · '),
        })
      await inTransaction(context, async (tx) => {
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const body = await bodyOf(tx, parts, given.waterBodyId)
        const rows = checked.flatMap(({ reading, result }) => {
          if (!result.ok) return []
          const { entered, ...value } = result.value
          return [
            {
              id: reading.id,
              waterBodyId: body.id,
              ...value,
              enteredValue: entered.value,
              enteredUnit: entered.unit,
              instrument: reading.instrument ?? null,
              note: reading.note ?? null,
              ...stamps,
            },
          ]
        })
        const created = await repository.insertReadings(tx, rows)
        const entered = rows
          .filter((row) => created.has(row.id))
          .map(({ id, parameter, enteredValue: value, enteredUnit: unit, below, scale }) => ({
            id,
            parameter,
            value,
            unit,
            below,
            ...(scale ? { scale } : {}),
          }))
        if (entered.length > 0)
          tx.audit({
            action: 'reading.record',
            subject: { kind: 'water-body', id: body.id, label: body.code },
            after: { happenedAt: stamps.happenedAt.toISOString(), readings: entered },
          })
      })
    },

    /** Says what is wanted of a parameter in an enclosure from now on; without limits, that nothing is. */
    async setRange(
      context: RequestContext,
      code: string,
      given: BodyOf<typeof contracts.setRange>,
    ): Promise<void> {
      const withdrawn = rangeLimits.every((limit) => !given[limit])
      const checked = withdrawn ? null : checkRange(given.parameter, given)
      if (checked && !checked.ok)
        throw refusedInput(
          `/${checked.refusal.field ?? 'unit'}`,
          sayRefusal(checked.refusal, parameterNames[given.parameter]),
          checked.refusal.code,
        )
      const limits = checked?.ok ? checked.value : null
      await inTransaction(context, async (tx) => {
        parts.enclosures.service.checkMayConfigure(tx)
        const enclosure = await parts.enclosures.questions.byCode(code, tx.manager)
        if (!enclosure) throw new Problem('not-found')
        const { created } = await repository.insertRange(tx, {
          id: given.id,
          enclosureId: enclosure.id,
          parameter: given.parameter,
          enteredUnit: limits?.enteredUnit ?? given.unit,
          outerLowEntered: limits?.entered.outerLow ?? null,
          innerLowEntered: limits?.entered.innerLow ?? null,
          innerHighEntered: limits?.entered.innerHigh ?? null,
          outerHighEntered: limits?.entered.outerHigh ?? null,
          canonicalUnit: limits?.range.unit ?? canonicalUnitsOf(given.parameter)[0] ?? given.unit,
          outerLow: limits?.range.outerLow ?? null,
          innerLow: limits?.range.innerLow ?? null,
          innerHigh: limits?.range.innerHigh ?? null,
          outerHigh: limits?.range.outerHigh ?? null,
          withdrawn,
          reason: given.reason ?? null,
          happenedAt: tx.at,
          happenedOn: await facility.dateOf(tx.at, tx),
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (created)
          tx.audit({
            action: withdrawn ? 'range.withdraw' : 'range.set',
            subject: { kind: 'enclosure', id: enclosure.id, label: enclosure.code },
            after: { parameter: given.parameter, unit: given.unit, ...limits?.entered },
          })
      })
    },

    /** Records a water change, backwash, media change or top-off. */
    async recordWaterEvent(
      context: RequestContext,
      given: BodyOf<typeof contracts.recordWaterEvent>,
    ): Promise<void> {
      const { amount, sharePercent, kind } = given
      const isChange = kind === 'water-change'
      if (isChange ? !amount === !sharePercent : Boolean(sharePercent))
        throw isChange
          ? refusedInput('/amount', waterDetails.amountOrShare, 'amount-or-share')
          : refusedInput('/sharePercent', waterDetails.shareOnlyForChange, 'share-only-for-change')
      const litres = amount
        ? parseQuantity(amount, { dimension: 'volume', above: 0, max: 100_000_000, field: 'amount' })
        : null
      if (litres && !litres.ok)
        throw refusedInput(
          '/amount',
          sayNumberRefusal(litres.refusal, waterDetails.amountField),
          litres.refusal.code,
        )
      const share = sharePercent
        ? parseQuantity(
            { value: sharePercent, unit: 'percent' },
            { dimension: 'percentage', above: 0, max: 100 },
          )
        : null
      if (share && !share.ok)
        throw refusedInput(
          '/sharePercent',
          sayNumberRefusal(share.refusal, waterDetails.shareField),
          share.refusal.code,
        )
      await inTransaction(context, async (tx) => {
        const stamps = await recordedStamps(tx, facility, given.happenedAt)
        const body = await bodyOf(tx, parts, given.waterBodyId)
        if (given.lifeSupportUnitId) {
          const unit = await repository.lockLifeSupport(tx, given.lifeSupportUnitId)
          if (!unit) throw new Problem('not-found')
        }
        const row = {
          id: given.id,
          waterBodyId: body.id,
          kind,
          amountEnteredValue: litres?.ok ? litres.value.entered.value : null,
          amountEnteredUnit: litres?.ok ? litres.value.entered.unit : null,
          amountLitres: litres?.ok ? litres.value.value : null,
          shareEnteredValue: share?.ok ? share.value.entered.value : null,
          sharePercent: share?.ok ? share.value.value : null,
          lifeSupportUnitId: given.lifeSupportUnitId ?? null,
          note: given.note ?? null,
          ...stamps,
        }
        const { created } = await repository.insertWaterEvent(tx, row)
        if (created)
          tx.audit({
            action: 'water-event.record',
            subject: { kind: 'water-body', id: body.id, label: body.code },
            after: {
              id: row.id,
              kind,
              amount: amount ?? null,
              sharePercent: sharePercent ?? null,
              happenedAt: stamps.happenedAt.toISOString(),
            },
          })
      })
    },

    /** Strikes a wrong record through. It stays readable; what follows from it is worked out anew. */
    async voidRecord(
      context: RequestContext,
      kind: VoidableKind,
      id: string,
      given: { reason: string },
    ): Promise<void> {
      await inTransaction(context, async (tx) => {
        const record = await repository.findVoidable(tx, kind, id)
        if (!record) throw new Problem('not-found')
        const { column } = repository.voidable[kind]
        await repository.insertVoid(tx, { id: parts.ids.next(), reason: given.reason, of: { [column]: id } })
        tx.audit({
          action: `${kind}.void`,
          subject: { kind, id, label: kind },
          before: JSON.parse(JSON.stringify(record)) as Json,
          after: { reason: given.reason },
        })
      })
    },
  }
}

export type MeasurementsService = ReturnType<typeof createMeasurementsService>
