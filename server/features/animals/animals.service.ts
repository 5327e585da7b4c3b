import type { Transactions } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FacilityService } from '../facility/index.ts'
import type { Afterwards } from './afterwards.ts'
import { createAccession } from './accession.service.ts'
import { createCounts } from './counts.service.ts'
import { createDiscrepancies } from './discrepancies.service.ts'
import { createFood } from './food.service.ts'
import { createGroups } from './groups.service.ts'
import { createIdentify } from './identify.service.ts'
import { createLedgers } from './ledgers.ts'
import { createLocks } from './locks.service.ts'
import { createMoves } from './moves.service.ts'
import type { WaterQuestions } from '../water/index.ts'
import { createStrikeAccession } from './strike-accession.service.ts'
import { createTaxaService } from './taxa.service.ts'
import { createWaterLocks } from './water-locks.ts'
import { createWeights } from './weights.service.ts'

/** Everything that can be done with animals: by people over the routes, and by other features in their transactions. */
export function createAnimalsService(parts: {
  transactions: Transactions
  ids: Ids
  facility: FacilityService
  water: WaterQuestions
  afterwards: Afterwards
}) {
  const withLedgers = { ...parts, ledgers: createLedgers(parts), waterLocks: createWaterLocks(parts) }
  const locks = createLocks(withLedgers)
  const moves = createMoves(withLedgers)
  const withMoves = { ...withLedgers, moves, locks }
  const identify = createIdentify(withMoves)
  const { lockMovement, liftMovement } = locks
  const { moveAnimal, strikeMove } = moves
  const { describeAnimal, addIdentifier, endIdentifier } = identify
  return {
    ...createTaxaService(parts),
    ...createAccession({ ...withMoves, identify }),
    ...createStrikeAccession(withLedgers),
    ...createGroups(withMoves),
    ...createCounts(withMoves),
    ...createWeights(withMoves),
    ...createDiscrepancies(withLedgers),
    ...createFood(withMoves),
    moveAnimal,
    strikeMove,
    describeAnimal,
    addIdentifier,
    endIdentifier,
    lockMovement,
    liftMovement,
  }
}

export type AnimalsService = ReturnType<typeof createAnimalsService>
