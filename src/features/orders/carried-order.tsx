import { benchCarryWords as words, carriedPartNames } from '../../../shared/messages/bench-carry.ts'
import { saidHead } from '../../lib/bench-carry.ts'
import type { CarryTo } from '../../lib/bench-carry.ts'
import { FromBench } from '../../ui/from-bench.tsx'
import type { CarriedPart } from './order-form-model.ts'

const parts: readonly CarriedPart[] = ['enclosureId', 'target', 'basis', 'division']

/** What came from the bench, which fields it filled, and that the amount is the order's own. */
export function CarriedIntoOrder({ carried }: { carried: CarryTo<'order'> }) {
  const fields = parts.filter((part) => carried[part] !== null).map((part) => carriedPartNames[part])
  return (
    <FromBench
      head={saidHead(carried.said)}
      says={fields.length === 0 ? words.inOrderNothing : words.inOrder({ fields: fields.join(', ') })}
      inputs={carried.said.inputs}
      working={carried.said.working}
    />
  )
}
