import type { WaterBody } from '../../../shared/contracts/enclosures.contract.ts'

const rank = { enclosure: 0, loop: 1, sump: 2 } as const
const byCode = new Intl.Collator('en', { numeric: true })

/** Waters by the code of their first enclosure, QT-9 before QT-10; within each, enclosures before loops and sumps. */
export function orderedWaters(waters: readonly (readonly WaterBody[])[]): WaterBody[][] {
  return waters
    .map((bodies) =>
      [...bodies].sort((a, b) => rank[a.kind] - rank[b.kind] || byCode.compare(a.code, b.code)),
    )
    .sort((a, b) => byCode.compare(a[0]?.code ?? '', b[0]?.code ?? ''))
}
