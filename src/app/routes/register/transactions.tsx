import { ArrowDownToLine, ArrowUpFromLine } from 'lucide-react'
import { transactionKindNames as kinds } from '../../../../shared/domain/register/transaction-kinds.ts'
import { transactionKindNames } from '../../../../shared/messages/register-kinds.ts'
import { registerWords as words } from '../../../../shared/messages/register-sheet.ts'
import {
  TransactionsList,
  transactionsAsked,
  transactionsCsvAddress,
} from '../../../features/acquisitions/index.ts'
import { choicesOf, FilterSelect } from '../../../lib/filter-select.tsx'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { paths } from '../../../lib/paths.ts'
import { SearchField } from '../../../lib/search-field.tsx'
import { ButtonLink } from '../../../ui/button-link.tsx'
import { ChoiceField } from '../../../ui/choice-field.tsx'
import { DownloadLink } from '../../../ui/download-link.tsx'
import { Filters } from '../../../ui/filters.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { TextField } from '../../../ui/text-field.tsx'
import { Tick } from '../../../ui/tick.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'

/** Transactions in and out: the first page of the register. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('register.manage')
  const asked = transactionsAsked(list)
  return (
    <ListSheet
      title={words.title}
      source={words.source}
      pages={<RegisterPages />}
      primary={
        may.allowed ? (
          <>
            <ButtonLink kind="primary" block icon={ArrowDownToLine} to={paths.newAcquisition()}>
              {words.newAcquisition}
            </ButtonLink>
            <ButtonLink block icon={ArrowUpFromLine} to={paths.newDisposition()}>
              {words.newDisposition}
            </ButtonLink>
          </>
        ) : (
          <p className="hint">{may.why}</p>
        )
      }
      search={<SearchField label={words.search} list={list} />}
      filters={
        <Filters {...list.filters}>
          <ChoiceField
            label={words.way}
            segments={[
              { value: 'both', label: words.both },
              { value: 'in', label: words.in },
              { value: 'out', label: words.out },
            ]}
            value={asked.way ?? 'both'}
            onChange={(way) => list.set({ way: way === 'both' ? undefined : way })}
          />
          <FilterSelect
            list={list}
            name="kind"
            label={words.kind}
            any={words.anyKind}
            options={choicesOf(kinds, transactionKindNames)}
          />
          <div className="pair">
            <TextField
              label={words.from}
              type="date"
              value={asked.from ?? ''}
              onChange={(event) => list.set({ since: event.target.value })}
            />
            <TextField
              label={words.until}
              type="date"
              value={asked.until ?? ''}
              onChange={(event) => list.set({ until: event.target.value })}
            />
          </div>
          <FilterSelect
            list={list}
            name="voided"
            label={words.standing}
            any={words.withVoided}
            options={[
              { value: 'no', label: words.onlyStanding },
              { value: 'yes', label: words.onlyVoided },
            ]}
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
          <DownloadLink href={transactionsCsvAddress(asked, false)}>{words.csv}</DownloadLink>
          <DownloadLink href={transactionsCsvAddress(asked, true)}>{words.csvGuarded}</DownloadLink>
        </>
      }
    >
      <TransactionsList list={list} />
    </ListSheet>
  )
}
