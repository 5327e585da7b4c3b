import type { DoseLine, Product } from '../../../shared/contracts/formulary.contract.ts'
import { agentNames } from '../../../shared/messages/formulary.ts'
import { useOfLine } from './dose-line-text.ts'

export interface FormularyFilter {
  q?: string | undefined
  agent?: string | undefined
  state?: string | undefined
}

const folded = (text: string) => text.normalize('NFKD').toLowerCase()
const hasAll = (text: string, q: string | undefined) =>
  folded(q ?? '')
    .split(/\s+/)
    .every((word) => folded(text).includes(word))

/** The lines that match every typed word, in drug, use or source; sorted by drug, use and range. */
export function matchingLines(lines: readonly DoseLine[], filter: FormularyFilter): DoseLine[] {
  const text = (line: DoseLine) => `${agentNames[line.agent]} ${useOfLine(line)} ${line.citation}`
  return lines
    .filter(
      (line) =>
        (!filter.agent || line.agent === filter.agent) &&
        (!filter.state || line.state === filter.state) &&
        hasAll(text(line), filter.q),
    )
    .sort((a, b) => text(a).localeCompare(text(b)) || a.high - b.high)
}

/** The products that match every typed word, in drug, name or lot. */
export function matchingProducts(products: readonly Product[], filter: FormularyFilter): Product[] {
  return products.filter(
    (product) =>
      (!filter.agent || product.agent === filter.agent) &&
      hasAll(
        `${agentNames[product.agent]} ${product.productName} ${product.lots.map((lot) => lot.lotNumber).join(' ')}`,
        filter.q,
      ),
  )
}
