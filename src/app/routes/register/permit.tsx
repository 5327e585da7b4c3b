import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import { permitWords as words } from '../../../../shared/messages/permits-sheet.ts'
import { sayInstant } from '../../../../shared/messages/say-date.ts'
import { PermitFacts, permitQuery, PermitView } from '../../../features/permits/index.ts'
import { useMe } from '../../../lib/me.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from './one-record.tsx'

/** One permit with its use-up. */
export function Component() {
  const { number = '' } = useParams()
  useSheetTitle(number)
  const { zone } = useMe().facility
  const query = useQuery(permitQuery(number))
  return (
    <OneRecord query={query} what={number}>
      {(permit, above) => (
        <Sheet recipe="list">
          <Area>
            <Cartouche
              place={<Link to={paths.permits()}>{words.title}</Link>}
              title={permit.number}
              source={words.source2({ at: sayInstant(permit.recordedAt, zone), by: permit.recordedBy })}
            />
            {permit.voided ? (
              <p className="notice">
                {words.voided({ ...permit.voided, at: sayInstant(permit.voided.at, zone) })}
              </p>
            ) : null}
            <div className="pane">
              <PermitFacts permit={permit} />
            </div>
          </Area>
          <Area className="pane">
            {above}
            <PermitView permit={permit} />
          </Area>
        </Sheet>
      )}
    </OneRecord>
  )
}
