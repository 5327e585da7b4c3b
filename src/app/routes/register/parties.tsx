import { useState } from 'react'
import { Plus } from 'lucide-react'
import { partyWords as words } from '../../../../shared/messages/party-sheet.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { PartiesList, PartyDialog } from '../../../features/counterparties/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { Button } from '../../../ui/button.tsx'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'
import { SearchField } from './search-field.tsx'

/** The other parties on file. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('register.manage')
  const [entering, setEntering] = useState(false)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={registerWords.title} title={words.title} source={words.source} />
        <div className="pane stack gap-4">
          <RegisterPages />
          <Button
            kind="primary"
            block
            icon={Plus}
            shut={!may.allowed && words.mayNot}
            onClick={() => setEntering(true)}
          >
            {words.enter}
          </Button>
          <SearchField label={words.search} list={list} />
        </div>
      </Area>
      <Area className="pane">
        <PartiesList list={list} />
        {entering ? <PartyDialog party={null} onBack={() => setEntering(false)} /> : null}
      </Area>
    </Sheet>
  )
}
