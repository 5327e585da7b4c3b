import { historySheetWords as words } from '../../../../shared/messages/history-sheet.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { ExportsList } from '../../../features/exports/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useMay } from '../../../lib/may.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'
import { SearchField } from './search-field.tsx'

/** Every file that left the register. */
export function Component() {
  useSheetTitle(words.exportsTitle)
  const list = useListState()
  const may = useMay('history.export')
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={registerWords.title} title={words.exportsTitle} source={words.exportsSource} />
        <div className="pane stack gap-4">
          <RegisterPages />
          {may.allowed ? <SearchField label={words.search} list={list} /> : null}
        </div>
      </Area>
      <Area className="pane">
        {may.allowed ? <ExportsList list={list} /> : <p className="t-read">{may.why}</p>}
      </Area>
    </Sheet>
  )
}
