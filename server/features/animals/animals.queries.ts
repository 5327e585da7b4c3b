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
import { readsClinical } from '../../../shared/domain/permissions/reads-clinical.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Clock } from '../../platform/clock.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import { readAnimals } from './animals.reads.ts'
import type { AnimalsFilter } from './animals.reads.ts'
import * as show from './animals.present.ts'
import * as chart from './chart.reads.ts'
import type { DiscrepanciesFilter } from './chart.reads.ts'
import { readFoodOrRelease } from './food.reads.ts'
import { readLog } from './log.reads.ts'
import { readTaxa } from './taxa.reads.ts'
import type { TaxaFilter } from './taxa.reads.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { AmountsLeftOut } from './amounts-left-out.ts'
import * as withhold from './withhold-clinical.ts'

export interface Found<T> {
  rows: T[]
  total: number
}

/** What screens and files ask of animals. */
export function createAnimalQueries(parts: { dataSource: Db; clock: Clock; amounts: AmountsLeftOut }) {
  const { dataSource: db, clock, amounts } = parts
  const present = () => clock.now()

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

    async animal(accession: string, actor: Actor): Promise<Animal> {
      const { roles } = actor
      const row = await rowOf(accession)
      const [ties, identifiers, locks, discrepancies, taxa, food] = await Promise.all([
        chart.readAnimalTies(db, row.id),
        chart.readIdentifiers(db, row.id),
        chart.readLocks(db, [row.id], present()),
        chart.readDiscrepancies(db, { animalIds: [row.id] }),
        readTaxa(db, { ids: [row.taxon_id] }),
        readFoodOrRelease(db, [row.id], present()),
      ])
      const taxon = taxa[0]
      const whole = show.presentAnimal(
        { row, ties, identifiers, locks, discrepancies, taxon, food: food.get(row.id) },
        roles,
      )
      const shown = { ...whole, discrepancies: await amounts.from(whole.discrepancies, actor) }
      return readsClinical(roles) ? shown : withhold.withholdFromAnimal(shown)
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

    async weights(accession: string, roles: readonly Role[]): Promise<WeightEntry[]> {
      const rows = await chart.readWeights(db, { animalId: (await rowOf(accession)).id })
      const shown = rows.map(show.presentWeight)
      return readsClinical(roles) ? shown : shown.map(withhold.withholdFromWeight)
    },

    async weight(id: string): Promise<WeightEntry> {
      const [row] = await chart.readWeights(db, { id })
      if (!row) throw new Problem('not-found')
      return show.presentWeight(row)
    },

    async moves(accession: string): Promise<MoveEntry[]> {
      return (await chart.readMoves(db, (await rowOf(accession)).id)).map(show.presentMove)
    },

    async counts(accession: string, roles: readonly Role[]) {
      const { id } = await rowOf(accession)
      const [lines, statements, deaths] = await Promise.all([
        chart.readCountLines(db, id),
        chart.readCountStatements(db, id),
        chart.readDeaths(db, { animalIds: [id] }),
      ])
      const isShown = readsClinical(roles)
      const shownLines = lines.map(show.presentCountLine)
      const shownDeaths = deaths.map(show.presentDeath)
      return {
        lines: isShown ? shownLines : shownLines.map(withhold.withholdFromCountLine),
        statements: statements.map((row) => ({
          ...show.presentFact(row),
          basis: row.basis,
          low: row.low,
          high: row.high,
          note: isShown ? row.note : withhold.hide(row.note),
        })),
        deaths: isShown ? shownDeaths : shownDeaths.map(withhold.withholdFromDeath),
      }
    },

    async death(id: string): Promise<Death> {
      const [row] = await chart.readDeaths(db, { id })
      if (!row) throw new Problem('not-found')
      return show.presentDeath(row)
    },

    async log(
      accession: string,
      page: { offset: number; limit: number },
      roles: readonly Role[],
    ): Promise<Found<LogLine>> {
      const rows = await readLog(db, (await rowOf(accession)).id, page)
      const shown = rows.map(show.presentLogLine)
      return {
        rows: readsClinical(roles) ? shown : shown.map(withhold.withholdFromLogLine),
        total: rows[0]?.total ?? 0,
      }
    },

    async discrepancies(filter: DiscrepanciesFilter, actor: Actor): Promise<Found<Discrepancy>> {
      const rows = await chart.readDiscrepancies(db, filter)
      const shown = await amounts.from(rows.map(show.presentDiscrepancy), actor)
      return {
        rows: readsClinical(actor.roles) ? shown : shown.map(withhold.withholdFromDiscrepancy),
        total: rows[0]?.total ?? 0,
      }
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
