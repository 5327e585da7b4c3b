import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { isMoveBreach } from '../../../shared/domain/animals/discrepancy.ts'
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
  const breach = animal.discrepancies.some(({ kind }) => isMoveBreach(kind))
  const { may } = judgeMove({ own: animal.locks, leaves: [], enters: [] }, animal.place?.boundary, toBoundary)
  if (may === 'no' || breach) return 'happened-already'
  if (may === 'yes') return 'nothing'
  return mayTransfer ? 'documented-transfer' : 'happened-already'
}

/**
 * What a move asks after the server refused it. Only the server knows the locks on the water and a hold that began after
 * the time of the move.
 *
 * @param code stable code of the refusal; undefined while nothing was refused
 */
export function asksAfter(asks: MoveAsks, code: string | undefined, mayTransfer: boolean): MoveAsks {
  if (code === 'movement-locked') return 'happened-already'
  if (code === 'documented-transfer-needed' && asks === 'nothing')
    return mayTransfer ? 'documented-transfer' : 'happened-already'
  return asks
}
