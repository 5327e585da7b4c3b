import { Plus } from 'lucide-react'
import { permitKinds } from '../../../../shared/domain/register/permit-kinds.ts'
import { permitWords as words } from '../../../../shared/messages/permits-sheet.ts'
import { permitKindNames, permitStateNames } from '../../../../shared/messages/register-kinds.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { permitsAsked, permitsCsvAddress, PermitsList } from '../../../features/permits/index.ts'
import { choicesOf, FilterSelect } from '../../../lib/filter-select.tsx'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { paths } from '../../../lib/paths.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { ButtonLink } from '../../../ui/button-link.tsx'
import { DownloadLink } from '../../../ui/download-link.tsx'
import { Filters } from '../../../ui/filters.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { Tick } from '../../../ui/tick.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'

const states = ['valid', 'runs-out', 'expired', 'not-yet', 'void'] as const

/** Permits and what is left of them. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('register.manage')
  const asked = permitsAsked(list)
  return (
    <ListSheet
      place={registerWords.title}
      title={words.title}
      source={words.source}
      pages={<RegisterPages />}
      primary={
        may.allowed ? (
          <ButtonLink kind="primary" block icon={Plus} to={paths.newPermit()}>
            {words.newPermit}
          </ButtonLink>
        ) : (
          <p className="hint">{may.why}</p>
        )
      }
      search={<SearchField label={words.search} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="state"
            label={words.state}
            any={words.anyState}
            options={choicesOf(states, permitStateNames)}
          />
          <FilterSelect
            list={list}
            name="kind"
            label={words.kind}
            any={words.anyKind}
            options={choicesOf(permitKinds, permitKindNames)}
          />
          <Tick
            label={words.onlyOpen}
            checked={asked.open === 'yes'}
            onChange={(event) => list.set({ open: event.target.checked ? 'yes' : undefined })}
          />
        </Filters>
      }
      acts={
        <>
          <DownloadLink href={permitsCsvAddress(asked, false)}>{registerWords.csv}</DownloadLink>
          <DownloadLink href={permitsCsvAddress(asked, true)}>{registerWords.csvGuarded}</DownloadLink>
        </>
      }
    >
      <PermitsList list={list} />
    </ListSheet>
  )
}
