import { useState } from 'react'
import { Printer } from 'lucide-react'
import { useQuery } from '@tanstack/react-query'
import { cautionLevels } from '../../../shared/domain/cautions/caution-rule.ts'
import { ruleSheetWords as words, thresholdStandings } from '../../../shared/messages/caution-rules-sheet.ts'
import { cautionLevelWords, cautionStageWords } from '../../../shared/messages/cautions.ts'
import { partWords } from '../../../shared/messages/parts.ts'
import { choicesOf, FilterSelect } from '../../lib/filter-select.tsx'
import { useListState } from '../../lib/list-state.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { SearchField } from '../../lib/search-field.tsx'
import { Button } from '../../ui/button.tsx'
import { Filters } from '../../ui/filters.tsx'
import { ListEmpty } from '../../ui/list-states.tsx'
import { ListSheet } from '../../ui/list-sheet.tsx'
import { cautionRulesQuery } from './queries.ts'
import { RuleSection } from './rule-section.tsx'
import { matchingRules, standings } from './rules-model.ts'

/** So few found rules are meant to be read, not chosen from. */
const readAtOnce = 2

/** Every rule of the cautions, folded, with what it rests on and the thresholds of this facility. */
export function RulesSheet() {
  const list = useListState()
  const query = useQuery(cautionRulesQuery)
  const [everyOpen, setEveryOpen] = useState(false)
  const all = query.data ?? []
  const shown = matchingRules(all, {
    q: list.get('q'),
    level: list.get('level'),
    when: list.get('when'),
    override: list.get('override'),
    standing: list.get('standing'),
  })
  const open = everyOpen || (list.narrowed && shown.length <= readAtOnce)
  return (
    <ListSheet
      place={words.place}
      title={words.title}
      source={words.source}
      search={<SearchField label={words.search} list={list} />}
      filters={
        <Filters {...list.filters}>
          <FilterSelect
            list={list}
            name="level"
            label={words.level}
            any={words.anyLevel}
            options={choicesOf(cautionLevels, cautionLevelWords)}
          />
          <FilterSelect
            list={list}
            name="when"
            label={words.when}
            any={words.anyWhen}
            options={choicesOf(['design', 'start'], cautionStageWords)}
          />
          <FilterSelect
            list={list}
            name="override"
            label={words.override}
            any={words.anyOverride}
            options={[
              { value: 'yes', label: words.overridableInShort },
              { value: 'no', label: words.notOverridableInShort },
            ]}
          />
          <FilterSelect
            list={list}
            name="standing"
            label={words.standing}
            any={words.anyStanding}
            options={choicesOf(standings, thresholdStandings)}
          />
        </Filters>
      }
      acts={
        shown.length > 0 ? (
          <Button icon={Printer} onClick={() => window.print()}>
            {words.print}
          </Button>
        ) : null
      }
    >
      <QueryStanding query={query} what={words.what} />
      {query.data === undefined ? null : shown.length > 0 ? (
        <>
          <div className="row row-wrap row-between rule-acts">
            <p role="status">{words.count({ shown: shown.length, all: all.length })}</p>
            <Button size="small" onClick={() => setEveryOpen(!everyOpen)}>
              {everyOpen ? words.closeAll : words.openAll}
            </Button>
          </div>
          <div className="rules">
            {shown.map((rule) => (
              <RuleSection key={rule.ruleId} rule={rule} open={open} />
            ))}
          </div>
        </>
      ) : list.narrowed ? (
        <ListEmpty
          title={partWords.noneMatch}
          act={<Button onClick={list.showAll}>{partWords.showAll}</Button>}
        >
          {partWords.noneMatchBody}
        </ListEmpty>
      ) : (
        <ListEmpty title={words.none}>{words.noneBody}</ListEmpty>
      )}
    </ListSheet>
  )
}
