import { bandForStage, judgeWeight } from '../../../shared/domain/animals/judge-weight.ts'
import type { WeightBand } from '../../../shared/domain/animals/judge-weight.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import type { UnitOf } from '../../../shared/domain/units/unit-table.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { animalRefusals, weightDoubts } from '../../../shared/messages/animal-refusals.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { isRepeated } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Animal } from './animal.entity.ts'
import { WeightRow } from './animal-ledgers.entity.ts'
import { descriptionAt } from './animals.repository.ts'
import * as repository from './ledgers.repository.ts'
import { subjectOf } from './moves.service.ts'
import type { MoveParts, Moves } from './moves.service.ts'
import { refuseField } from './refuse.ts'
import { checkMayStrike } from './strikes.ts'
import { readTaxa } from './taxa.reads.ts'

export interface WeightRequest {
  id: string
  weight: { value: string; unit: string }
  animalsWeighed?: number | undefined
  basis: 'measured' | 'estimated'
  method?: string | undefined
  confirmedReason?: string | undefined
  happenedAt: string
}

/** Heavier than any animal in a house: a slip of the unit. */
const heaviestGrams = 50_000_000

/** A mass in kg in the unit that a person typed, short enough for a sentence. */
function sayMass(kg: number, unit: UnitOf<'mass'>): string {
  const converted = convert(kg, 'kg', unit)
  const value = converted.ok ? converted.value : kg
  return `${String(Number(value.toPrecision(4)))}\u00a0${unitOf(converted.ok ? unit : 'kg').symbol}`
}

export function createWeights(parts: MoveParts & { moves: Moves }) {
  /** The band in force for the animal as it was then, and the name of its taxon. */
  async function bandOf(
    tx: Tx,
    animal: Animal,
    at: Date,
  ): Promise<{ band: WeightBand | null; taxon: string }> {
    const known = await descriptionAt(tx, animal.id, at)
    const [taxon] = await readTaxa(tx.manager, { ids: [known?.taxonId ?? animal.taxonId] })
    const bands = (taxon?.weight_bands ?? []).map((band) => ({
      stage: band.stage,
      lowKg: band.low_kg,
      highKg: band.high_kg,
    }))
    return { band: bandForStage(bands, known?.stage ?? animal.stage), taxon: taxon?.common_name ?? '' }
  }

  return {
    /**
     * Records a weight. One that is hard to believe is asked back once and kept with the reason; the row says what
     * spoke against it.
     */
    async recordWeight(context: RequestContext, accession: string, given: WeightRequest): Promise<void> {
      const parsed = parseQuantity(given.weight, {
        dimension: 'mass',
        above: 0,
        max: heaviestGrams,
        field: 'weight',
      })
      if (!parsed.ok) throw refuseField('bad-input', '/weight', sayNumberRefusal(parsed.refusal))
      const animalsWeighed = given.animalsWeighed ?? 1
      const { entered } = parsed.value
      const weightKg = parsed.value.value / 1000 / animalsWeighed
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await parts.moves.lockByAccession(tx, accession)
        const times = await parts.facility.timesOf(tx, given.happenedAt)
        const content = {
          id: given.id,
          animalId: animal.id,
          enteredValue: entered.value,
          enteredUnit: entered.unit,
          animalsWeighed,
          basis: given.basis,
          method: given.method ?? null,
          happenedAt: times.happenedAt,
        }
        if (await isRepeated(tx, WeightRow, content)) return
        if (animal.form === 'individual' && animalsWeighed !== 1)
          throw refuseField('bad-input', '/animalsWeighed', animalRefusals.groupsOnly({ accession }))
        const newestKg = await repository.newestWeightKg(tx, animal.id, times.happenedAt)
        const { band, taxon } = await bandOf(tx, animal, times.happenedAt)
        const judged = judgeWeight(weightKg, band, newestKg)
        if (!judged.ok)
          throw refuseField('bad-input', '/weight', sayNumberRefusal({ ...judged.refusal, field: 'weight' }))
        const { value: verdict } = judged
        if (verdict.verdict === 'needs-confirmation' && given.confirmedReason === undefined) {
          const detail = weightDoubts[verdict.doubt]({
            weight: sayMass(weightKg, entered.unit),
            taxon,
            band: band ? `${sayMass(band.lowKg, entered.unit)} to ${sayMass(band.highKg, entered.unit)}` : '',
            newest: newestKg === null ? '' : sayMass(newestKg, entered.unit),
          })
          throw new Problem('weight-needs-confirmation', {
            detail,
            errors: [{ pointer: '/weight', detail, code: verdict.doubt }],
            extra: { doubt: verdict.doubt },
          })
        }
        const doubt = verdict.verdict === 'plausible' ? null : verdict.doubt
        await repository.insertWeight(tx, {
          ...content,
          ...times,
          weightKg,
          doubt,
          confirmedReason: doubt === null ? null : (given.confirmedReason ?? null),
        })
        tx.audit({
          action: 'animal.weigh',
          subject: subjectOf(animal),
          before: { weightKg: newestKg },
          after: { weightKg, entered: { ...entered }, animalsWeighed, doubt, reason: given.confirmedReason },
        })
      })
    },

    async strikeWeight(
      context: RequestContext,
      accession: string,
      id: string,
      reason: string,
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const animal = await parts.moves.lockByAccession(tx, accession)
        const weight = await repository.findWeight(tx, id)
        if (weight?.animalId !== animal.id) throw new Problem('not-found')
        if (await repository.isStruck(tx, 'weightId', id)) return
        await checkMayStrike(parts, tx, 'weight.strike', weight)
        await repository.strike(tx, { id: parts.ids.next(), what: 'weightId', rowId: id, reason })
        tx.audit({
          action: 'animal.strike-weight',
          subject: subjectOf(animal),
          before: { value: weight.enteredValue, unit: weight.enteredUnit },
          after: { reason },
        })
      })
    },
  }
}
