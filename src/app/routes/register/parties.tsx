import { useState } from 'react'
import { Plus } from 'lucide-react'
import { partyWords as words } from '../../../../shared/messages/party-sheet.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { PartiesList, PartyDialog } from '../../../features/counterparties/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { Button } from '../../../ui/button.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'

/** The other parties on file. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('register.manage')
  const [entering, setEntering] = useState(false)
  return (
    <ListSheet
      place={registerWords.title}
      title={words.title}
      source={words.source}
      pages={<RegisterPages />}
      primary={
        <Button
          kind="primary"
          block
          icon={Plus}
          shut={!may.allowed && words.mayNot}
          onClick={() => setEntering(true)}
        >
          {words.enter}
        </Button>
      }
      search={<SearchField label={words.search} list={list} />}
    >
      <PartiesList list={list} />
      {entering ? <PartyDialog party={null} onBack={() => setEntering(false)} /> : null}
    </ListSheet>
  )
}
