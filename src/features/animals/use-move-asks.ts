import { useState } from 'react'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { useMe } from '../../lib/me.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { asksAfter, judgeMoveTo } from './move-form-model.ts'
import type { MoveAsks } from './move-form-model.ts'

interface MoveRule {
  asks: MoveAsks
  /** The server asks for it, and has said why. */
  isTold: boolean
  /** Keeps what the server refused, and throws it on. */
  heed: (error: unknown) => never
}

/** What a move to an enclosure asks for, by what is known here and by what the server refused of it. */
export function useMoveAsks(
  animal: Animal,
  target: { id: string; boundary: string | null } | undefined,
): MoveRule {
  const mayTransfer = useMe().roles.includes('veterinarian')
  const [refused, setRefused] = useState<{ targetId: string; code: string } | null>(null)
  const foreseen = judgeMoveTo(animal, target?.boundary, mayTransfer)
  // Another enclosure is another question
  const code = refused !== null && refused.targetId === target?.id ? refused.code : undefined
  const asks = asksAfter(foreseen, code, mayTransfer)
  return {
    asks,
    isTold: asks !== foreseen,
    heed: (error) => {
      if (target && isProblem(error, 'movement-locked', 'documented-transfer-needed'))
        setRefused({ targetId: target.id, code: error.code })
      throw error
    },
  }
}
