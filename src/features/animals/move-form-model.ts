import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { judgeMove } from '../../../shared/domain/animals/judge-move.ts'

/** What a move to an enclosure asks of the person: nothing, a documented transfer, or that it has happened already. */
export type MoveAsks = 'nothing' | 'documented-transfer' | 'happened-already'

/**
 * The same judgement that the server makes, before the move is sent.
 *
 * @param mayTransfer the person is a veterinarian, who moves across a boundary by a documented transfer
 */
export function judgeMoveTo(
  animal: Pick<Animal, 'locks' | 'place' | 'discrepancies'>,
  toBoundary: string | null | undefined,
  mayTransfer: boolean,
): MoveAsks {
  if (toBoundary === undefined) return 'nothing'
  const breach = animal.discrepancies.some(
    ({ kind }) => kind === 'moved-under-lock' || kind === 'crossed-boundary',
  )
  const { may } = judgeMove(animal.locks, animal.place?.boundary, toBoundary)
  if (may === 'no' || breach) return 'happened-already'
  if (may === 'yes') return 'nothing'
  return mayTransfer ? 'documented-transfer' : 'happened-already'
}
