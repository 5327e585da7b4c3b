import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatUnrounded } from '../../../shared/domain/quantities/format-unrounded.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import type { EnteredQuantity } from '../../../shared/contracts/primitives.ts'
import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { orderViewWords as words } from '../../../shared/messages/orders-screens.ts'
import { Conditions } from '../../ui/condition-row.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { WorkingBlock } from '../../ui/working-block.tsx'
import { DoseText } from './dose-text.tsx'

type Water = OrderPreview['water']

/** A quantity as entered on an order, written by the rule for doses. */
export function doseOfEntered(entered: EnteredQuantity): string {
  const { value, unit } = entered
  return isUnitCode(unit) && Number.isFinite(Number(value))
    ? formatDose(value, unit).text
    : `${value}\u00a0${unit}`
}

/** "3 doses, every 48 h". */
export function dosesText({
  doses,
  intervalHours,
}: Pick<BathOrderFields, 'doses' | 'intervalHours'>): string {
  return words.dosesText({
    doses,
    hours: doses === 1 || intervalHours === null ? null : formatDose(intervalHours, 'h').text,
  })
}

/** The working of an amount, line by line; the last line is what is weighed or measured. */
export function OrderWorking({ lines }: { lines: OrderPreview['working'] }) {
  const last = lines.length - 1
  return (
    <WorkingBlock
      label={words.workingLabel}
      rows={lines.map((line, i) => ({
        key: line.key,
        what: line.label,
        formula: line.shown,
        result: <DoseText text={line.result} kind={line.key.includes('volume') ? 'volume' : 'dose'} />,
        ...(i === last ? { kind: 'sum' as const } : {}),
      }))}
    />
  )
}

/** From the last line of the working to what is weighed: the step of the balance, and what the volume's error makes of it. */
export function AmountNotes({
  amount,
  division,
}: {
  amount: NonNullable<OrderPreview['amount']>
  division: EnteredQuantity | null
}) {
  const unrounded = formatUnrounded(amount.unrounded, amount.unroundedUnit)
  return (
    <>
      {amount.measured && division ? (
        <p className="t-note">
          {words.rounded({
            unrounded: unrounded.text,
            division: doseOfEntered(division),
            amount: amount.text,
          })}
        </p>
      ) : null}
      {amount.rangeText ? <p className="t-note">{words.range({ range: amount.rangeText })}</p> : null}
    </>
  )
}

/** What has to be true before each dose; judged at the dose, never ticked here. */
export function OrderConditions({ conditions }: { conditions: OrderPreview['conditions'] }) {
  if (conditions.length === 0)
    return (
      <section>
        <h2 className="t-head">{words.conditions}</h2>
        <p className="t-2">{words.noConditions}</p>
      </section>
    )
  return (
    <Conditions
      heading={words.conditions}
      note={words.conditionsNote}
      conditions={conditions.map((condition) => ({
        key: condition.ruleId,
        state: 'open' as const,
        what: condition.text,
        ...(condition.secondCalculation ? { known: words.secondPerson } : {}),
      }))}
    />
  )
}

/** Connected water and everybody in it: who is treated, and who only shares the water. */
export function OrderWater({
  water,
  valves = [],
  heading,
}: {
  water: Water
  valves?: readonly { code: string; state: string }[]
  heading: string
}) {
  const columns: TableColumn<Water['animals'][number]>[] = [
    {
      id: 'accession',
      heading: words.accession,
      cell: (row) => <span className="num">{row.accession}</span>,
    },
    {
      id: 'animal',
      heading: words.animal,
      narrow: 'head',
      cell: (row) => (
        <>
          {row.commonName}
          <span className="sci block">{row.scientificName}</span>
        </>
      ),
    },
    { id: 'count', heading: words.count, narrow: 'short', cell: (row) => row.countText },
    {
      id: 'place',
      heading: words.place,
      narrow: 'short',
      cell: (row) => <span className="num">{row.enclosureCode}</span>,
    },
    {
      id: 'treated',
      heading: words.treated,
      cell: (row) => (row.treated ? <b>{words.isTreated}</b> : words.shares),
    },
  ]
  return (
    <section className="stack">
      <h2 className="t-head">{heading}</h2>
      <p className="t-2">
        {words.joined({ bodies: water.bodies.join(', ') })}{' '}
        {valves.map((valve) => words.valve(valve)).join(', ')}
      </p>
      <DataTable
        label={words.animals}
        columns={columns}
        rows={water.animals}
        rowKey={(row) => row.animalId}
        density="close"
        instead={water.animals.length === 0 ? <p className="t-2 py-2">{words.nobody}</p> : undefined}
      />
    </section>
  )
}
