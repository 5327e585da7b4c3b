import { historySheetWords as words } from '../../../../shared/messages/history-sheet.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { ExportsList } from '../../../features/exports/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'

/** Every file that left the register. */
export function Component() {
  useSheetTitle(words.exportsTitle)
  const list = useListState()
  const may = useMay('history.export')
  return (
    <ListSheet
      place={registerWords.title}
      title={words.exportsTitle}
      source={words.exportsSource}
      pages={<RegisterPages />}
      search={may.allowed ? <SearchField label={words.search} list={list} /> : null}
    >
      {may.allowed ? <ExportsList list={list} /> : <p className="t-read">{may.why}</p>}
    </ListSheet>
  )
}
