import { useState } from 'react'
import type { Lot, Product } from '../../../shared/contracts/formulary.contract.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { formularyWords as words, lotStateNames } from '../../../shared/messages/formulary-screens.ts'
import { sayDate, sayInstant } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { Button } from '../../ui/button.tsx'
import { DataTable } from '../../ui/data-table.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import { ListEmpty } from '../../ui/list-states.tsx'
import { Tag } from '../../ui/tag.tsx'
import { LotDialog } from './lot-dialog.tsx'

const strengthOf = ({ value, unit }: Product['strength']) =>
  isUnitCode(unit) ? formatDose(value, unit).text : `${value}\u00a0${unit}`

/** Products with their strength as on the label, and their lots with whether each may be used today. */
export function Products({ products, zone }: { products: readonly Product[]; zone: string }) {
  const stock = useMay('stock.manage')
  const [noting, setNoting] = useState<Lot | null>(null)
  const columns: TableColumn<Product>[] = [
    {
      id: 'product',
      heading: words.product,
      sort: (product) => `${agentNames[product.agent]} ${product.productName}`,
      cell: (product) => (
        <>
          <b>{agentNames[product.agent]}</b>
          <span className="block">
            {product.productName} {product.inUse ? null : <Tag>{words.notInUse}</Tag>}
          </span>
        </>
      ),
    },
    {
      id: 'strength',
      heading: words.strength,
      cell: (product) =>
        product.record === 'broken' ? (
          <b>{words.notAsEntered}</b>
        ) : (
          <>
            <b data-quantity="dose">{strengthOf(product.strength)}</b>
            <span className="block">{basisNames[product.strengthBasis]}</span>
            {product.densityGPerMl === null ? null : (
              <span className="t-note block">
                {words.density({ density: formatDose(product.densityGPerMl, 'g/mL').text })}
              </span>
            )}
          </>
        ),
    },
    {
      id: 'lots',
      heading: words.lots,
      cell: (product) =>
        product.lots.length === 0 ? (
          <span className="t-2">{words.noLots}</span>
        ) : (
          <ul className="stack">
            {product.lots.map((lot) => (
              <li key={lot.id} className="row row-wrap">
                <span>
                  {words.lot({ lot: lot.lotNumber, expires: sayDate(lot.expiresOn) })}
                  {', '}
                  <b className={lot.state === 'usable' ? undefined : 'text-magenta'}>
                    {lotStateNames[lot.state]}
                  </b>
                  {lot.foundClearAt === null ? null : (
                    <span className="t-note block">
                      {words.clear({ at: sayInstant(lot.foundClearAt, zone) })}
                    </span>
                  )}
                </span>
                {stock.allowed ? (
                  <Button
                    size="small"
                    aria-label={words.noteFor({ lot: lot.lotNumber })}
                    onClick={() => setNoting(lot)}
                  >
                    {words.note}
                  </Button>
                ) : null}
              </li>
            ))}
          </ul>
        ),
    },
  ]
  return (
    <>
      <DataTable
        label={words.products}
        columns={columns}
        rows={products}
        rowKey={(product) => product.id}
        density="roomy"
        instead={
          products.length === 0 ? <ListEmpty title={words.noProducts}>{words.noneBody}</ListEmpty> : undefined
        }
      />
      {noting ? <LotDialog lot={noting} onDone={() => setNoting(null)} /> : null}
    </>
  )
}
