import { useQuery } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { orderPhases } from '../../../../shared/contracts/orders.contract.ts'
import { weightFormWords } from '../../../../shared/messages/weight-form.ts'
import { orderListWords as words, orderPhaseNames } from '../../../../shared/messages/orders-screens.ts'
import { everyEnclosure } from '../../../features/enclosures/index.ts'
import { ordersAsked, ordersCsvAddress, OrdersList } from '../../../features/orders/index.ts'
import { choicesOf, FilterSelect } from '../../../lib/filter-select.tsx'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { paths } from '../../../lib/paths.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { ButtonLink } from '../../../ui/button-link.tsx'
import { DownloadLink } from '../../../ui/download-link.tsx'
import { Filters } from '../../../ui/filters.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Treatment orders. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('order.draft')
  const { data: enclosures } = useQuery(everyEnclosure)
  const asked = ordersAsked(list)
  return (
    <ListSheet
      title={words.title}
      source={words.source}
      primary={
        may.allowed ? (
          <div className="stack">
            <ButtonLink kind="primary" block icon={Plus} to={paths.newOrder()}>
              {may.conditions.includes('proposal-only') ? words.propose : words.write}
            </ButtonLink>
            <ButtonLink block to={paths.doseByWeight()}>
              {weightFormWords.toList}
            </ButtonLink>
          </div>
        ) : (
          <p className="hint">{may.why}</p>
        )
      }
      search={<SearchField label={words.search} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="phase"
            label={words.phase}
            any={words.anyPhase}
            options={[{ value: 'open', label: words.open }, ...choicesOf(orderPhases, orderPhaseNames)]}
          />
          <FilterSelect
            list={list}
            name="enclosure"
            label={words.enclosure}
            any={words.anyEnclosure}
            options={(enclosures?.rows ?? []).map((row) => ({
              value: row.code,
              label: `${row.code}, ${row.name}`,
            }))}
          />
        </Filters>
      }
      acts={<DownloadLink href={ordersCsvAddress(asked)}>{words.csv}</DownloadLink>}
    >
      <OrdersList list={list} />
    </ListSheet>
  )
}
