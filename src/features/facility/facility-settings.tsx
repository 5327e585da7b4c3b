import { useQuery } from '@tanstack/react-query'
import { facilityWords, peopleWords } from '../../../shared/messages/people.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { settingsQuery } from './queries.ts'
import { SettingRow } from './setting-row.tsx'

/** Every facility setting, with who confirmed it and when. */
export function FacilitySettings() {
  const query = useQuery(settingsQuery)
  const problem = isProblem(query.error) ? query.error : null
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={peopleWords.place} title={facilityWords.title} source={facilityWords.source} />
      </Area>
      <Area className="pane stack gap-6">
        {problem ? (
          <ListUnreadable why={problem.says} code={problem.requestId} onRetry={() => void query.refetch()} />
        ) : null}
        {query.isPending ? <ListFetching what={facilityWords.settings} /> : null}
        {query.data?.map((setting) => (
          <SettingRow key={setting.key} setting={setting} />
        ))}
      </Area>
    </Sheet>
  )
}
