import { useEffect, useRef } from 'react'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { orderViewWords, settingNames } from '../../../shared/messages/orders-screens.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import type { Product } from '../../../shared/contracts/formulary.contract.ts'
import type { BathOrderFields, BenchAsked } from '../../../shared/contracts/order-primitives.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import { differences } from './order-form-model.ts'
import { doseOfEntered } from './order-parts.tsx'

const labels = (): Record<keyof BathOrderFields, string> => ({
  enclosureId: words.enclosure,
  animalIds: words.animals,
  productId: words.product,
  lotId: words.lot,
  doseLineId: words.line,
  problem: words.problem,
  use: words.use,
  target: words.target,
  basis: words.basis,
  timing: words.timing,
  contactMinutes: words.contact,
  doses: words.doses,
  intervalHours: words.interval,
  startsAt: words.startsAt,
  setting: words.setting,
  division: words.division,
  stopIf: words.stopIf,
  instructions: words.instructions,
  allowedVolumeDriftPercent: words.drift,
  stated: words.stated,
  bench: words.bench,
})

/** A part of an order in a few words, for comparing; ids are told apart by what they name. */
export function sayPart(
  name: keyof BathOrderFields,
  fields: BathOrderFields,
  known: {
    zone: string
    products: readonly Product[]
    animals: ReadonlyMap<string, string>
    bench: (asked: BenchAsked) => string
  },
): string {
  const value = fields[name]
  if (value === null || value === undefined || value === '') return words.nothing
  switch (name) {
    case 'target':
      return fields.target ? doseOfEntered(fields.target) : words.nothing
    case 'division':
      return fields.division ? doseOfEntered(fields.division) : words.nothing
    case 'startsAt':
      return fields.startsAt ? sayInstant(fields.startsAt, known.zone) : words.nothing
    case 'productId': {
      const product = known.products.find((one) => one.id === value)
      return product ? `${agentNames[product.agent]} (${product.productName})` : String(value)
    }
    case 'lotId':
      return (
        known.products.flatMap((one) => one.lots).find((lot) => lot.id === value)?.lotNumber ?? String(value)
      )
    case 'animalIds':
      return fields.animalIds.map((id) => known.animals.get(id) ?? id).join(', ') || words.nothing
    case 'basis':
      return fields.basis ? basisNames[fields.basis] : words.nothing
    case 'timing':
      return fields.timing === 'timed' ? words.timed : words.indefinite
    case 'use':
      return fields.use === 'extralabel' ? orderViewWords.extralabel : orderViewWords.asLabelled
    case 'setting':
      return fields.setting ? settingNames[fields.setting] : words.nothing
    case 'bench':
      return fields.bench ? known.bench(fields.bench) : words.nothing
    case 'stated':
      return Object.values(fields.stated)
        .flat()
        .filter((one) => one !== null)
        .map(String)
        .join(', ')
    default:
      return String(value)
  }
}

/** Two people wrote the same draft: both texts, side by side, and the choice between them. */
export function StaleChoice({
  theirs,
  mine,
  known,
  busy,
  onMine,
  onTheirs,
}: {
  theirs: BathOrderFields | null
  mine: BathOrderFields
  known: Parameters<typeof sayPart>[2]
  busy: boolean
  onMine: () => void
  onTheirs: () => void
}) {
  const block = useRef<HTMLDivElement>(null)
  // it stands at the head of the form, and whoever saved may be at its foot
  useEffect(() => {
    // a browser may answer with a promise, which is no clean-up
    void block.current?.scrollIntoView({ block: 'center' })
  }, [])
  if (!theirs)
    return (
      <div ref={block} className="unit-question" role="alert">
        <p>{words.staleSigned}</p>
      </div>
    )
  const rows = differences(theirs, mine).map((name) => ({
    name,
    theirs: sayPart(name, theirs, known),
    mine: sayPart(name, mine, known),
  }))
  return (
    <div ref={block} className="stale-choice" role="alert">
      <h2 className="t-head">{words.staleTitle}</h2>
      <p>{rows.length === 0 ? words.staleNone : words.staleBody}</p>
      {rows.length === 0 ? null : (
        <DataTable
          label={words.staleTitle}
          density="close"
          rowKey={(row) => row.name}
          rows={rows}
          columns={[
            { id: 'name', heading: words.staleField, cell: (row) => labels()[row.name] },
            { id: 'theirs', heading: words.staleTheirs, cell: (row) => row.theirs },
            { id: 'mine', heading: words.staleMine, cell: (row) => row.mine },
          ]}
        />
      )}
      <div className="row row-wrap">
        <Button kind="primary" disabled={busy} onClick={onMine}>
          {words.keepMine}
        </Button>
        <Button disabled={busy} onClick={onTheirs}>
          {words.takeTheirs}
        </Button>
      </div>
    </div>
  )
}
