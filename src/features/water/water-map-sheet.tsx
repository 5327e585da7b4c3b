import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { Plus } from 'lucide-react'
import type { WaterBody } from '../../../shared/contracts/enclosures.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { mapWords } from '../../../shared/messages/water-map.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ListEmpty } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { BodyDialog, ConnectionDialog, MachineDialog } from './map-dialogs.tsx'
import { orderedWaters } from './ordered-waters.ts'
import { waterMapQuery } from './queries.ts'
import { ValveRows } from './valve-rows.tsx'

/** Which bodies share one water now, with every valve and pump; and where new ones are entered. */
export function WaterMapSheet() {
  const me = useMe()
  const query = useQuery(waterMapQuery())
  const mayRecord = useMay('water.record').allowed
  const mayConfigure = decide('water.configure', me.roles, { 'proposal-only': false }).allowed
  const [asked, setAsked] = useState<'body' | 'connection' | 'machine' | null>(null)
  const map = query.data
  const sayWhen = (at: string) => sayMoment(at, me.facility.zone, map?.asOf ?? at)
  const bodyOf = new Map((map?.bodies ?? []).map((body) => [body.id, body]))
  const waters = orderedWaters((map?.waters ?? []).map((ids) => ids.flatMap((id) => bodyOf.get(id) ?? [])))
  const back = () => setAsked(null)

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.water()}>{waterWords.title}</Link>}
          title={mapWords.title}
          source={mapWords.source}
        />
        {mayConfigure ? (
          <div className="pane stack justify-items-start">
            <Button icon={Plus} onClick={() => setAsked('body')}>
              {mapWords.newBody}
            </Button>
            <Button icon={Plus} onClick={() => setAsked('connection')}>
              {mapWords.newConnection}
            </Button>
            <Button icon={Plus} onClick={() => setAsked('machine')}>
              {mapWords.newMachine}
            </Button>
          </div>
        ) : null}
      </Area>
      <Area>
        <div className="px-4">
          <QueryStanding query={query} what={mapWords.title} />
        </div>
        {map && waters.length === 0 ? (
          <div className="px-4">
            <ListEmpty title={mapWords.none} />
          </div>
        ) : null}
        {waters.map((bodies) => (
          <OneWater key={bodies[0]?.id} bodies={bodies}>
            <ValveRows
              rows={(map?.connections ?? []).filter(
                (row) => row.inside && bodies.some((body) => body.id === row.fromBodyId),
              )}
              mayRecord={mayRecord}
              volumeHolds={false}
              sayWhen={sayWhen}
            />
          </OneWater>
        ))}
        {map?.connections.some((row) => !row.inside) ? (
          <section className="pane ink-pane stack">
            <h2 className="t-head">{mapWords.between}</h2>
            <ValveRows
              rows={map.connections.filter((row) => !row.inside)}
              mayRecord={mayRecord}
              volumeHolds={false}
              sayWhen={sayWhen}
            />
          </section>
        ) : null}
      </Area>
      {asked === 'body' ? <BodyDialog onBack={back} /> : null}
      {asked === 'connection' ? <ConnectionDialog bodies={map?.bodies ?? []} onBack={back} /> : null}
      {asked === 'machine' ? <MachineDialog bodies={map?.bodies ?? []} onBack={back} /> : null}
    </Sheet>
  )
}

function OneWater({ bodies, children }: { bodies: readonly WaterBody[]; children: React.ReactNode }) {
  return (
    <section className="pane ink-pane stack">
      <h2 className="t-head">
        {bodies.map((body, i) => (
          <span key={body.id}>
            {i > 0 ? ', ' : ''}
            {body.kind === 'enclosure' ? <Link to={paths.enclosure(body.code)}>{body.code}</Link> : body.code}
          </span>
        ))}
      </h2>
      <p className="t-2">{bodies.map((body) => body.name).join(', ')}</p>
      {bodies.length > 1 ? children : null}
    </section>
  )
}
