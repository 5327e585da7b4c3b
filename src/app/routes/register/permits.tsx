import { Download, Plus } from 'lucide-react'
import { permitKinds } from '../../../../shared/domain/register/permit-kinds.ts'
import { permitWords as words } from '../../../../shared/messages/permits-sheet.ts'
import { permitKindNames, permitStateNames } from '../../../../shared/messages/register-kinds.ts'
import { registerWords } from '../../../../shared/messages/register-sheet.ts'
import { permitsAsked, permitsCsvAddress, PermitsList } from '../../../features/permits/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { useMay } from '../../../lib/may.ts'
import { paths } from '../../../lib/paths.ts'
import { ButtonLink } from '../../../ui/button-link.tsx'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Icon } from '../../../ui/icon.tsx'
import { SelectField } from '../../../ui/select-field.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { Tick } from '../../../ui/tick.tsx'
import { useMedia } from '../../../ui/use-media.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { RegisterPages } from './register-pages.tsx'
import { SearchField } from './search-field.tsx'

const states = ['valid', 'runs-out', 'expired', 'not-yet', 'void'] as const

/** Permits and what is left of them. */
export function Component() {
  useSheetTitle(words.title)
  const list = useListState()
  const may = useMay('register.manage')
  const wide = useMedia('(min-width: 601px)')
  const asked = permitsAsked(list)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={registerWords.title} title={words.title} source={words.source} />
        <div className="pane stack gap-4">
          <RegisterPages />
          {may.allowed ? (
            <ButtonLink kind="primary" block icon={Plus} to={paths.newPermit()}>
              {words.newPermit}
            </ButtonLink>
          ) : (
            <p className="hint">{may.why}</p>
          )}
          <SearchField label={words.search} list={list} />
          <details className="fold" open={wide}>
            <summary>{registerWords.filters}</summary>
            <div className="stack gap-3">
              <SelectField
                label={words.state}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyState },
                  ...states.map((value) => ({ value, label: permitStateNames[value] })),
                ]}
                value={asked.state ?? ''}
                onChange={(event) => list.set({ state: event.target.value })}
              />
              <SelectField
                label={words.kind}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyKind },
                  ...permitKinds.map((value) => ({ value, label: permitKindNames[value] })),
                ]}
                value={asked.kind ?? ''}
                onChange={(event) => list.set({ kind: event.target.value })}
              />
              <Tick
                label={words.onlyOpen}
                checked={asked.open === 'yes'}
                onChange={(event) => list.set({ open: event.target.checked ? 'yes' : undefined })}
              />
            </div>
          </details>
          <p className="row row-wrap">
            <a href={permitsCsvAddress(asked, false)} download className="row">
              <Icon of={Download} />
              {registerWords.csv}
            </a>
            <a href={permitsCsvAddress(asked, true)} download className="row">
              <Icon of={Download} />
              {registerWords.csvGuarded}
            </a>
          </p>
        </div>
      </Area>
      <Area className="pane">
        <PermitsList list={list} />
      </Area>
    </Sheet>
  )
}
