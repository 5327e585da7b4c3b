import { benchSheetWords as words } from '../../../../shared/messages/bench-sheet.ts'
import { CalculatorList } from '../../../features/bench/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** The calculators to choose from. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  return (
    <ListSheet
      title={words.title}
      source={words.source}
      search={<SearchField label={words.search} list={list} />}
    >
      <CalculatorList q={list.get('q') ?? ''} />
    </ListSheet>
  )
}
