import { useQuery } from '@tanstack/react-query'
import { agentCodes } from '../../../../shared/domain/formulary/agent.ts'
import { agentNames } from '../../../../shared/messages/formulary.ts'
import { formularyWords as words, lineStateNames } from '../../../../shared/messages/formulary-screens.ts'
import {
  DoseLines,
  formularyQuery,
  matchingLines,
  matchingProducts,
  Products,
} from '../../../features/formulary/index.ts'
import { useListState } from '../../../lib/list-state.ts'
import { useMe } from '../../../lib/me.ts'
import { Filters } from '../../../ui/filters.tsx'
import { ListSheet } from '../../../ui/list-sheet.tsx'
import { SelectField } from '../../../ui/select-field.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'
import { SearchField } from '../../../lib/search-field.tsx'

const states = ['default', 'confirmed', 'proposed'] as const

/** Dose lines with their sources, and products with their lots. */
export function Component() {
  useSheetTitle(words.sheet)
  const list = useListState()
  const { zone } = useMe().facility
  const query = useQuery(formularyQuery)
  const filter = { q: list.get('q'), agent: list.get('drug'), state: list.get('state') }
  return (
    <OneRecord query={query} what={words.title}>
      {({ lines, products }, above) => (
        <ListSheet
          place={words.place}
          title={words.title}
          source={words.source}
          search={<SearchField label={words.search} list={list} />}
          filters={
            <Filters {...list.filters}>
              <SelectField
                label={words.drug}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyDrug },
                  ...agentCodes
                    .filter((agent) => [...lines, ...products].some((one) => one.agent === agent))
                    .map((value) => ({ value, label: agentNames[value] })),
                ]}
                value={filter.agent ?? ''}
                onChange={(event) => list.set({ drug: event.target.value })}
              />
              <SelectField
                label={words.state}
                startsEmpty={false}
                options={[
                  { value: '', label: words.anyState },
                  ...states.map((value) => ({ value, label: lineStateNames[value] })),
                ]}
                value={filter.state ?? ''}
                onChange={(event) => list.set({ state: event.target.value })}
              />
            </Filters>
          }
        >
          {above}
          <section className="stack">
            <h2 className="t-head">{words.lines}</h2>
            <DoseLines lines={matchingLines(lines, filter)} zone={zone} />
          </section>
          <section className="stack">
            <h2 className="t-head">{words.products}</h2>
            <Products products={matchingProducts(products, filter)} zone={zone} />
          </section>
        </ListSheet>
      )}
    </OneRecord>
  )
}
