import { useQuery } from '@tanstack/react-query'
import { Download, Plus } from 'lucide-react'
import { orderPhases } from '../../../../shared/contracts/orders.contract.ts'
import { orderListWords as words, orderPhaseNames } from '../../../../shared/messages/orders-screens.ts'
import { everyEnclosure } from '../../../features/enclosures/index.ts'
import { ordersAsked, ordersCsvAddress, OrdersList } from '../../../features/orders/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import type { ListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { paths } from '../../../lib/paths.ts'
import { ButtonLink } from '../../../ui/button-link.tsx'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Icon } from '../../../ui/icon.tsx'
import { SelectField } from '../../../ui/select-field.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useMedia } from '../../../ui/use-media.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { SearchField } from '../register/search-field.tsx'

/** Treatment orders. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('order.draft')
  const wide = useMedia('(min-width: 601px)')
  const { data: enclosures } = useQuery(everyEnclosure)
  const asked = ordersAsked(list)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche title={words.title} source={words.source} />
        <div className="pane stack gap-4">
          {may.allowed ? (
            <ButtonLink kind="primary" block icon={Plus} to={paths.newOrder()}>
              {may.conditions.includes('proposal-only') ? words.propose : words.write}
            </ButtonLink>
          ) : (
            <p className="hint">{may.why}</p>
          )}
          <SearchField label={words.search} list={list} />
          <details className="fold" open={wide}>
            <summary>{words.filters}</summary>
            <div className="stack gap-3">
              <SelectField
                label={words.phase}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyPhase },
                  { value: 'open', label: words.open },
                  ...orderPhases.map((value) => ({ value, label: orderPhaseNames[value] })),
                ]}
                value={asked.phase ?? ''}
                onChange={(event) => list.set({ phase: event.target.value })}
              />
              <SelectField
                label={words.enclosure}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyEnclosure },
                  ...(enclosures?.rows ?? []).map((row) => ({
                    value: row.code,
                    label: `${row.code}, ${row.name}`,
                  })),
                ]}
                value={asked.enclosureCode ?? ''}
                onChange={(event) => list.set({ enclosure: event.target.value })}
              />
              {wide ? null : <SortField list={list} />}
            </div>
          </details>
          <p>
            <a href={ordersCsvAddress(asked)} download className="row">
              <Icon of={Download} />
              {words.csv}
            </a>
          </p>
        </div>
      </Area>
      <Area className="pane">
        <OrdersList list={list} />
      </Area>
    </Sheet>
  )
}

/** The order of the cards: on a phone there are no headings to sort by. */
function SortField({ list }: { list: ListState }) {
  const value = `${list.get('sort') ?? 'number'} ${list.get('direction') ?? 'desc'}`
  return (
    <SelectField
      label={words.sort}
      startsEmpty={false}
      options={[
        { value: 'number desc', label: words.sortNumber },
        { value: 'number asc', label: words.sortNumberUp },
        { value: 'startsAt asc', label: words.sortStart },
        { value: 'startsAt desc', label: words.sortStartDown },
        { value: 'enclosure asc', label: words.sortEnclosure },
        { value: 'signedAt desc', label: words.sortSigned },
      ]}
      value={value}
      onChange={(event) => {
        const [sort, direction] = event.target.value.split(' ')
        list.set({ sort, direction })
      }}
    />
  )
}
