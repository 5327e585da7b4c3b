import { useQuery } from '@tanstack/react-query'
import { facilityWords, peopleWords } from '../../../shared/messages/people.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { settingsQuery } from './queries.ts'
import { SettingRow } from './setting-row.tsx'

/** Every facility setting, with who confirmed it and when. */
export function FacilitySettings() {
  const query = useQuery(settingsQuery)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={peopleWords.place} title={facilityWords.title} source={facilityWords.source} />
      </Area>
      <Area className="pane stack gap-6">
        <QueryStanding query={query} what={facilityWords.settings} />
        {query.data?.map((setting) => (
          <SettingRow key={setting.key} setting={setting} />
        ))}
      </Area>
    </Sheet>
  )
}
