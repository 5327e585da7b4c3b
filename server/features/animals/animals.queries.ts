import type {
  Animal,
  AnimalRow,
  Death,
  Discrepancy,
  LogLine,
  MoveEntry,
  WeightEntry,
} from '../../../shared/contracts/animals.contract.ts'
import type { TaxonRow } from '../../../shared/contracts/taxa.contract.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { latestRecorded } from '../../platform/http/check-time.ts'
import { Problem } from '../../platform/http/problem.ts'
import { readAnimals } from './animals.reads.ts'
import type { AnimalsFilter } from './animals.reads.ts'
import * as show from './animals.present.ts'
import * as chart from './chart.reads.ts'
import type { DiscrepanciesFilter } from './chart.reads.ts'
import { readLog } from './log.reads.ts'
import { readTaxa } from './taxa.reads.ts'
import type { TaxaFilter } from './taxa.reads.ts'

export interface Found<T> {
  rows: T[]
  total: number
}

/** What screens and files ask of animals. */
export function createAnimalQueries(parts: { dataSource: Db; clock: Clock }) {
  const { dataSource: db, clock } = parts
  // a phone whose clock goes ahead must not hide what it has just recorded
  const present = () => latestRecorded(clock.now())

  async function rowOf(accession: string) {
    const [row] = await readAnimals(db, { at: present(), accession })
    if (!row) throw new Problem('not-found')
    return row
  }

  return {
    async animals(filter: Omit<AnimalsFilter, 'at'> & { at?: Date }): Promise<Found<AnimalRow>> {
      const rows = await readAnimals(db, { ...filter, at: filter.at ?? present() })
      return { rows: rows.map(show.presentAnimalRow), total: rows[0]?.total ?? 0 }
    },

    async animal(accession: string, roles: readonly Role[]): Promise<Animal> {
      const row = await rowOf(accession)
      const [ties, identifiers, locks, discrepancies, taxa] = await Promise.all([
        chart.readAnimalTies(db, row.id),
        chart.readIdentifiers(db, row.id),
        chart.readLocks(db, [row.id], present()),
        chart.readDiscrepancies(db, { animalIds: [row.id] }),
        readTaxa(db, { ids: [row.taxon_id] }),
      ])
      return show.presentAnimal({ row, ties, identifiers, locks, discrepancies, taxon: taxa[0] }, roles)
    },

    /** Number of an animal by its id. */
    async accessionOf(id: string): Promise<string> {
      const [row] = await readAnimals(db, { at: present(), ids: [id] })
      if (!row) throw new Problem('not-found')
      return row.accession
    },

    async inhabitants(code: string, at: Date = present()): Promise<AnimalRow[]> {
      if (!(await chart.enclosureExists(db, code))) throw new Problem('not-found')
      const rows = await readAnimals(db, { at, place: code })
      return rows.map(show.presentAnimalRow)
    },

    async weights(accession: string): Promise<WeightEntry[]> {
      const rows = await chart.readWeights(db, { animalId: (await rowOf(accession)).id })
      return rows.map(show.presentWeight)
    },

    async weight(id: string): Promise<WeightEntry> {
      const [row] = await chart.readWeights(db, { id })
      if (!row) throw new Problem('not-found')
      return show.presentWeight(row)
    },

    async moves(accession: string): Promise<MoveEntry[]> {
      return (await chart.readMoves(db, (await rowOf(accession)).id)).map(show.presentMove)
    },

    async counts(accession: string) {
      const { id } = await rowOf(accession)
      const [lines, statements, deaths] = await Promise.all([
        chart.readCountLines(db, id),
        chart.readCountStatements(db, id),
        chart.readDeaths(db, { animalIds: [id] }),
      ])
      return {
        lines: lines.map(show.presentCountLine),
        statements: statements.map((row) => ({
          ...show.presentFact(row),
          basis: row.basis,
          low: row.low,
          high: row.high,
          note: row.note,
        })),
        deaths: deaths.map(show.presentDeath),
      }
    },

    async death(id: string): Promise<Death> {
      const [row] = await chart.readDeaths(db, { id })
      if (!row) throw new Problem('not-found')
      return show.presentDeath(row)
    },

    async log(accession: string, page: { offset: number; limit: number }): Promise<Found<LogLine>> {
      const rows = await readLog(db, (await rowOf(accession)).id, page)
      return { rows: rows.map(show.presentLogLine), total: rows[0]?.total ?? 0 }
    },

    async discrepancies(filter: DiscrepanciesFilter): Promise<Found<Discrepancy>> {
      const rows = await chart.readDiscrepancies(db, filter)
      return { rows: rows.map(show.presentDiscrepancy), total: rows[0]?.total ?? 0 }
    },

    async taxa(filter: TaxaFilter): Promise<Found<TaxonRow>> {
      const rows = await readTaxa(db, filter)
      return { rows: rows.map(show.presentTaxon), total: rows[0]?.total ?? 0 }
    },

    async taxon(id: string): Promise<TaxonRow> {
      const [row] = await readTaxa(db, { ids: [id] })
      if (!row) throw new Problem('not-found')
      return show.presentTaxon(row)
    },
  }
}

export type AnimalQueries = ReturnType<typeof createAnimalQueries>
