import type { AnimalForm, LifeStage, Sex } from '../../../shared/domain/animals/description.ts'
import { bandForStage } from '../../../shared/domain/animals/judge-weight.ts'
import type { WeightBand } from '../../../shared/domain/animals/judge-weight.ts'
import type { SensitivityCode, SensitivityLevel } from '../../../shared/domain/taxa/sensitivity.ts'
import type { QuarantineKindName, TaxonGroup } from '../../../shared/domain/taxa/taxon-group.ts'
import type { Count, NewestWeight } from '../../../shared/contracts/animal-primitives.ts'
import type { Db } from '../../platform/database/db.ts'
import { doseSource } from './animal-watch.entity.ts'
import { presentCount, presentNewestWeight } from './animals.present.ts'
import { readAnimals } from './animals.reads.ts'
import type { AnimalReadRow } from './animals.reads.ts'
import { countOpenDiscrepancies, readDeaths, readDiscrepancies, readLocksFrom } from './chart.reads.ts'
import { readHandling, readWhereabouts } from './handled.reads.ts'
import { readFoodOrRelease, readJoined } from './food.reads.ts'
import { readStaysIn } from './stays.reads.ts'
import { readTaxa } from './taxa.reads.ts'

/** An animal or group as a rule, an order or a case asks about it, at one instant. */
export interface AnimalFacts {
  animalId: string
  accession: string
  form: AnimalForm
  name: string | null
  taxonId: string
  scientificName: string
  commonName: string
  taxonGroup: TaxonGroup
  quarantineKind: QuarantineKindName
  sex: Sex
  stage: LifeStage
  /** null outside the house. */
  enclosureId: string | null
  enclosureCode: string | null
  count: Count
  newestWeight: NewestWeight | null
  /** Row of the newest weight. */
  newestWeightId: string | null
  weightBand: WeightBand | null
  sensitivities: { code: SensitivityCode; level: SensitivityLevel }[]
  lock: 'none' | 'boundary' | 'all'
  openDiscrepancies: number
}

/** Narrow answers that other features need of animals. Pass the transaction's manager as `db` to ask inside it. */
export function createAnimalQuestions(parts: { dataSource: Db }) {
  async function facts(db: Db, rows: AnimalReadRow[]): Promise<AnimalFacts[]> {
    const taxa = await readTaxa(db, { ids: [...new Set(rows.map((row) => row.taxon_id))] })
    return rows.map((row) => {
      const taxon = taxa.find((one) => one.id === row.taxon_id)
      const bands = (taxon?.weight_bands ?? []).map((band) => ({
        stage: band.stage,
        lowKg: band.low_kg,
        highKg: band.high_kg,
      }))
      return {
        animalId: row.id,
        accession: row.accession,
        form: row.form,
        name: row.name,
        taxonId: row.taxon_id,
        scientificName: row.scientific_name,
        commonName: row.common_name,
        taxonGroup: row.taxon_group,
        quarantineKind: row.quarantine_kind,
        sex: row.sex,
        stage: row.stage,
        enclosureId: row.enclosure_id,
        enclosureCode: row.enclosure_id === null ? null : row.enclosure_code,
        count: presentCount(row),
        newestWeight: presentNewestWeight(row),
        newestWeightId: row.weight_id,
        weightBand: bandForStage(bands, row.stage),
        sensitivities: (taxon?.sensitivities ?? []).map(({ code, level }) => ({ code, level })),
        lock: row.lock,
        openDiscrepancies: row.open_discrepancies,
      }
    })
  }

  return {
    /** Everybody in any of the enclosures at an instant, by accession number; groups of none are left out. */
    async animalsIn(
      enclosureIds: readonly string[],
      at: Date,
      db: Db = parts.dataSource,
    ): Promise<AnimalFacts[]> {
      const rows = await readAnimals(db, { at, enclosureIds })
      return (await facts(db, rows)).filter((one) => one.count.high > 0)
    },

    /** The animals under these ids, as they stood at an instant; unknown ids are left out. */
    async animalsById(ids: readonly string[], at: Date, db: Db = parts.dataSource): Promise<AnimalFacts[]> {
      return facts(db, await readAnimals(db, { at, ids }))
    },

    /** The animal under an accession number as it stood at an instant; null when there is none. */
    async animalByAccession(
      accession: string,
      at: Date,
      db: Db = parts.dataSource,
    ): Promise<AnimalFacts | null> {
      return (await facts(db, await readAnimals(db, { at, accession })))[0] ?? null
    },

    /** An animal with every group that joined it, or joined those. */
    joinedBy: (animalId: string, db: Db = parts.dataSource) => readJoined(db, animalId),

    /** Whether these animals may be eaten or set free, as it was known at an instant; nothing where nobody said. */
    foodOrRelease: (animalIds: readonly string[], at: Date, db: Db = parts.dataSource) =>
      readFoodOrRelease(db, animalIds, at),

    /** Movement locks in force at an instant that some cases or clock events put on. */
    async locksFrom(sourceIds: readonly string[], at: Date, db: Db = parts.dataSource) {
      const rows = await readLocksFrom(db, sourceIds, at)
      return rows.map((row) => ({
        lockId: row.id,
        animalId: row.animal_id,
        kind: row.kind,
        sourceKind: row.source_kind,
        sourceId: row.source_id,
        sourceLabel: row.source_label,
        since: row.happened_at.toISOString(),
      }))
    },

    /** Deaths of these animals, the newest first, struck-out ones left out. */
    async deathsOf(animalIds: readonly string[], db: Db = parts.dataSource) {
      const rows = await readDeaths(db, { animalIds })
      return rows
        .filter((row) => row.struck_reason === null)
        .map((row) => ({
          deathId: row.id,
          animalId: row.animal_id,
          kind: row.kind,
          seenCount: row.seen_count,
          enclosureId: row.place?.id ?? null,
          happenedAt: row.happened_at.toISOString(),
          happenedOn: row.happened_on,
          recordedAt: row.recorded_at.toISOString(),
          recordedBy: row.recorded_by_name ?? '',
        }))
    },

    /** Discrepancies of these animals that nobody has explained: they lock clearance and what rests on a count. */
    async openDiscrepanciesOf(animalIds: readonly string[], db: Db = parts.dataSource) {
      const rows = await readDiscrepancies(db, { animalIds })
      return rows.map((row) => ({
        discrepancyId: row.id,
        animalId: row.animal_id,
        kind: row.kind,
        forRole: row.for_role,
        happenedAt: row.happened_at.toISOString(),
      }))
    },

    /** How many discrepancies of these doses nobody has explained: they lock the next dose. */
    async openDiscrepanciesOfDoses(doseIds: readonly string[], db: Db = parts.dataSource): Promise<number> {
      return countOpenDiscrepancies(db, doseSource, doseIds)
    },

    /** Stays in any of the enclosures that touch a time, for tracing; `until` null lasts on. */
    async staysIn(
      enclosureIds: readonly string[],
      during: { from: Date; until: Date },
      db: Db = parts.dataSource,
    ) {
      const rows = await readStaysIn(db, { enclosureIds, ...during })
      return rows.map((row) => ({
        animalId: row.animal_id,
        enclosureId: row.enclosure_id,
        from: row.from_at.toISOString(),
        until: row.until_at?.toISOString() ?? null,
      }))
    },

    /** Where these animals were since an instant, also as part of the group that they were taken out of. */
    async whereabouts(animalIds: readonly string[], from: Date, db: Db = parts.dataSource) {
      const rows = await readWhereabouts(db, animalIds, from)
      return rows.map((row) => ({
        animalId: row.animal_id,
        asId: row.as_id,
        enclosureId: row.enclosure_id,
        from: row.from_at.toISOString(),
        until: row.until_at?.toISOString() ?? null,
      }))
    },

    /** When these animals were moved, weighed or joined by others, as it was recorded; the own moves of a bath left out. */
    handling: (
      animalIds: readonly string[],
      during: { from: Date; at: Date; exceptInto: string | null },
      db: Db = parts.dataSource,
    ) => readHandling(db, animalIds, during),

    /** Every stay of these animals, the earliest first. */
    async staysOf(animalIds: readonly string[], db: Db = parts.dataSource) {
      const rows = await readStaysIn(db, { animalIds })
      return rows.map((row) => ({
        animalId: row.animal_id,
        enclosureId: row.enclosure_id,
        from: row.from_at.toISOString(),
        until: row.until_at?.toISOString() ?? null,
      }))
    },
  }
}

export type AnimalQuestions = ReturnType<typeof createAnimalQuestions>
