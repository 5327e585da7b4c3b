import { useState } from 'react'
import type { BathOrderFields, SaidBench } from '../../../shared/contracts/order-primitives.ts'
import { benchCarryWords as words, carriedPartNames } from '../../../shared/messages/bench-carry.ts'
import { orderFormWords } from '../../../shared/messages/order-form.ts'
import { orderBenchWords } from '../../../shared/messages/orders.ts'
import { saidHead } from '../../lib/bench-carry.ts'
import type { CarryTo } from '../../lib/bench-carry.ts'
import { Button } from '../../ui/button.tsx'
import { FromBench } from '../../ui/from-bench.tsx'
import type { CarriedPart } from './order-form-model.ts'

const parts: readonly CarriedPart[] = ['enclosureId', 'target', 'basis', 'division']

/** What came from the bench just now: it names where each figure was found, and which fields it filled. */
function justCarried({ said, ...carried }: CarryTo<'order'>) {
  const fields = parts.filter((part) => carried[part] !== null).map((part) => carriedPartNames[part])
  return {
    head: saidHead(said),
    says: fields.length === 0 ? words.inOrderNothing : words.inOrder({ fields: fields.join(', ') }),
    inputs: said.inputs,
    working: said.working,
  }
}

/**
 * In the form: what is kept of the bench with the order, beside its own amount, and the way to leave it out. Left out, it
 * can be put back until the form is left.
 */
export function CarriedIntoOrder({
  bench,
  carried,
  said,
  withheld,
  onChange,
}: {
  /** What the form holds; see OrderValues. */
  bench: BathOrderFields['bench']
  carried: CarryTo<'order'> | null
  /** What the server says to it. */
  said: SaidBench | null
  /** Something is kept that this person was not shown. */
  withheld: boolean
  onChange: (bench: BathOrderFields['bench']) => void
}) {
  const [left, setLeft] = useState<{ bench: BathOrderFields['bench'] } | null>(null)
  const putBack = () => {
    if (left) onChange(left.bench)
    setLeft(null)
  }
  if (bench === null)
    return left ? (
      <p className="row row-wrap">
        {orderFormWords.benchLeft}{' '}
        <Button size="small" onClick={putBack}>
          {orderFormWords.benchBack}
        </Button>
      </p>
    ) : null
  const leave = (
    <Button
      size="small"
      onClick={() => {
        setLeft({ bench })
        onChange(null)
      }}
    >
      {orderFormWords.benchLeave}
    </Button>
  )
  const isJust = carried !== null && JSON.stringify(carried.bench) === JSON.stringify(bench)
  const shown = isJust ? justCarried(carried) : said && { ...said, says: orderFormWords.benchKept }
  if (shown === null)
    return bench === undefined && !withheld ? null : (
      <div className="stack">
        <p>{bench === undefined ? orderFormWords.benchNotShown : orderBenchWords.heading}</p>
        <div>{leave}</div>
      </div>
    )
  return (
    <FromBench {...shown} sources={said?.sources ?? []}>
      {said?.comparison ? <p>{said.comparison}</p> : null}
      <div>{leave}</div>
    </FromBench>
  )
}

/** On the page of an order: what was worked out before it was written. */
export function OrderBench({ said }: { said: SaidBench }) {
  return (
    <FromBench
      {...said}
      head={`${orderBenchWords.heading}: ${said.head}.`}
      says={said.comparison ?? orderBenchWords.notTheAmount}
    />
  )
}
