import type { LifeStage } from '../../../shared/domain/animals/description.ts'
import type { SourceMark } from '../../../shared/domain/sources.ts'
import type { SensitivityCode, SensitivityLevel } from '../../../shared/domain/taxa/sensitivity.ts'
import { quarantineKindOf } from '../../../shared/domain/taxa/taxon-group.ts'
import type { TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import type { Transactions } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { refuseField } from './refuse.ts'
import * as repository from './taxa.repository.ts'

export interface TaxonRequest {
  scientificName: string
  commonName: string
  group: TaxonGroup
  note?: string | undefined
}

export interface WeightBandRequest {
  id: string
  stage: LifeStage | null
  low: string
  high: string
  unit: string
  source: string
  mark: SourceMark
}

const subject = (taxon: { id: string; scientificName: string }) => ({
  kind: 'taxon',
  id: taxon.id,
  label: taxon.scientificName,
})

/** The list of taxa: names and weights by the registrar, sensitivities by a veterinarian. */
export function createTaxaService(parts: { transactions: Transactions }) {
  const columns = (given: TaxonRequest) => ({
    scientificName: given.scientificName,
    commonName: given.commonName,
    taxonGroup: given.group,
    quarantineKind: quarantineKindOf(given.group),
    note: given.note ?? null,
  })

  return {
    async enterTaxon(context: RequestContext, given: TaxonRequest & { id: string }): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const row = {
          id: given.id,
          ...columns(given),
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
          version: 1,
        }
        const { created } = await repository.insertTaxon(tx, row)
        if (created) tx.audit({ action: 'taxon.enter', subject: subject(row), after: columns(given) })
      })
    },

    async correctTaxon(
      context: RequestContext,
      id: string,
      given: TaxonRequest & { expectedVersion: number },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const before = await repository.lockTaxon(tx, id)
        if (!before) throw new Problem('not-found')
        await repository.saveTaxon(tx, { id, version: given.expectedVersion }, columns(given))
        const { scientificName, commonName, taxonGroup, note } = before
        tx.audit({
          action: 'taxon.correct',
          subject: subject(before),
          before: { scientificName, commonName, taxonGroup, note },
          after: columns(given),
        })
      })
    },

    /** Enters a band of plausible weights; the one before for this stage stays readable. */
    async enterWeightBand(context: RequestContext, taxonId: string, given: WeightBandRequest): Promise<void> {
      const end = (which: 'low' | 'high') =>
        parseQuantity(
          { value: given[which], unit: given.unit },
          { dimension: 'mass', above: 0, field: 'weight' },
        )
      const low = end('low')
      const high = end('high')
      if (!low.ok) throw refuseField('bad-input', '/low', sayNumberRefusal(low.refusal))
      if (!high.ok) throw refuseField('bad-input', '/high', sayNumberRefusal(high.refusal))
      if (high.value.value < low.value.value)
        throw refuseField('bad-input', '/high', animalRefusals.bandReversed)
      await parts.transactions.inTransaction(context, async (tx) => {
        const taxon = await repository.lockTaxon(tx, taxonId)
        if (!taxon) throw new Problem('not-found')
        const content = {
          id: given.id,
          taxonId,
          stage: given.stage,
          lowEnteredValue: low.value.entered.value,
          highEnteredValue: high.value.entered.value,
          enteredUnit: low.value.entered.unit,
          source: given.source,
          mark: given.mark,
        }
        const { created } = await repository.insertWeightBand(tx, {
          ...content,
          lowKg: low.value.value / 1000,
          highKg: high.value.value / 1000,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (created)
          tx.audit({ action: 'taxon.enter-weight-band', subject: subject(taxon), after: { ...content } })
      })
    },

    /** Says what a taxon bears or does not; the entry before stays readable. */
    async setSensitivity(
      context: RequestContext,
      taxonId: string,
      given: { id: string; code: SensitivityCode; level: SensitivityLevel; note?: string | undefined },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const taxon = await repository.lockTaxon(tx, taxonId)
        if (!taxon) throw new Problem('not-found')
        const { id, code, level } = given
        const { created } = await repository.insertSensitivity(tx, {
          id,
          taxonId,
          code,
          level,
          note: given.note ?? null,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (created)
          tx.audit({
            action: 'taxon.set-sensitivity',
            subject: subject(taxon),
            after: { code, level, note: given.note },
          })
      })
    },
  }
}
