import { compareInstants } from '../time/instant-arithmetic.ts'
import type { CountEntry } from './count-entry.ts'

/**
 * Transfers whose two halves do not cancel: the check that splits and merges neither make nor lose animals.
 *
 * A sound transfer has exactly two live lines, of two different groups, of opposite and equal size, at one instant, as
 * `split-out` and `split-in` or `merge-out` and `merge-in`. A split or merge line without a transfer id is unsound too.
 *
 * @param entries lines of all groups concerned, any order
 * @returns ids of the unsound transfers, sorted; `''` stands for lines that carry none
 */
export function findUnbalancedTransfers(entries: readonly CountEntry[]): string[] {
  const byTransfer = new Map<string, CountEntry[]>()
  for (const entry of entries) {
    const isHalf = /^(split|merge)-/.test(entry.kind)
    if (entry.voided || (entry.transferId === null && !isHalf)) continue
    const id = entry.transferId ?? ''
    byTransfer.set(id, [...(byTransfer.get(id) ?? []), entry])
  }
  return [...byTransfer]
    .filter(([id, halves]) => id === '' || !isSound(halves))
    .map(([id]) => id)
    .sort()
}

function isSound(halves: readonly CountEntry[]): boolean {
  const out = halves.find((entry) => entry.delta < 0)
  const into = halves.find((entry) => entry.delta > 0)
  if (halves.length !== 2 || !out || !into) return false
  const kinds = `${out.kind} ${into.kind}`
  return (
    out.delta + into.delta === 0 &&
    out.animalId !== into.animalId &&
    compareInstants(out.at, into.at) === 0 &&
    (kinds === 'split-out split-in' || kinds === 'merge-out merge-in')
  )
}
