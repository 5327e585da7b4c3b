import type { Parts } from '../../platform/parts.ts'
import type { Water } from '../water/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { Animal, AnimalDescription, Identifier, IdentifierEnd } from './animal.entity.ts'
import {
  AnimalVoid,
  CountEntryRow,
  CountStatementRow,
  DeathRow,
  MoveRow,
  WeightRow,
} from './animal-ledgers.entity.ts'
import { createAfterwards } from './afterwards.ts'
import { animalRecordRoutes } from './animal-records.routes.ts'
import {
  DiscrepancyResolutionRow,
  DiscrepancyRow,
  MovementLockLiftRow,
  MovementLockRow,
} from './animal-watch.entity.ts'
import { createAmountsLeftOut } from './amounts-left-out.ts'
import { createAnimalQueries } from './animals.queries.ts'
import { createAnimalQuestions } from './animals.questions.ts'
import { animalRoutes } from './animals.routes.ts'
import { createAnimalsService } from './animals.service.ts'
import { FoodStatementRow } from './food-statement.entity.ts'
import { taxaRoutes } from './taxa.routes.ts'
import { Taxon, TaxonSensitivity, TaxonWeightBand } from './taxon.entity.ts'

export type { Accession, CountChange } from './accession.service.ts'
export { amountFacts } from './amounts-left-out.ts'
export type { AnimalFacts, AnimalQuestions } from './animals.questions.ts'
export type { AnimalsService } from './animals.service.ts'
export type { LockSource } from './locks.service.ts'
export { checkMayStrike } from './strikes.ts'
export { verifyAnimals } from './verify-animals.ts'

export const animalEntities = [
  Taxon,
  TaxonWeightBand,
  TaxonSensitivity,
  Animal,
  AnimalDescription,
  Identifier,
  IdentifierEnd,
  FoodStatementRow,
  CountEntryRow,
  CountStatementRow,
  MoveRow,
  WeightRow,
  DeathRow,
  AnimalVoid,
  DiscrepancyRow,
  DiscrepancyResolutionRow,
  MovementLockRow,
  MovementLockLiftRow,
]

export function createAnimals(given: Parts & { facility: FacilityService; water: Water }) {
  const parts = { ...given, water: given.water.questions }
  const afterwards = createAfterwards()
  const service = createAnimalsService({ ...parts, afterwards })
  const amounts = createAmountsLeftOut()
  const queries = createAnimalQueries({ ...parts, amounts })
  return {
    service,
    queries,
    amounts,
    questions: createAnimalQuestions(parts),
    /** For features that rest on animals: what they do when the ledgers change. */
    follow: afterwards.follow,
    routes: [
      ...animalRoutes(queries, parts.clock),
      ...animalRecordRoutes(service, queries),
      ...taxaRoutes(service, queries),
    ],
  }
}

export type Animals = ReturnType<typeof createAnimals>
