import { useState } from 'react'
import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Pencil, Plus } from 'lucide-react'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import { capital } from '../../../shared/messages/capital.ts'
import { enclosureKindNames } from '../../../shared/messages/enclosures.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { sayMoment } from '../../lib/say-moment.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ComputedLine } from '../../ui/computed-line.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { EventDialog } from './event-dialog.tsx'
import { EventRows } from './event-rows.tsx'
import { IsolationRows } from './isolation-rows.tsx'
import { LifeSupportRows } from './life-support-rows.tsx'
import { NetVolume } from './net-volume.tsx'
import { orderedWaters } from './ordered-waters.ts'
import { ReadingsPane } from './readings-pane.tsx'
import { ValveRows } from './valve-rows.tsx'
import { Worksheet } from './worksheet.tsx'

/**
 * An enclosure: who and what it is, the volume to dose by with its worksheet, the water that it shares now, its
 * machines, what was done to the water, and what was measured.
 *
 * @param flag     quarantine or hold, said by the features that know
 * @param children further areas of the left column, such as who lives here and which orders run in this water
 */
export function EnclosureSheet({
  water,
  flag,
  children,
}: {
  water: WaterOfEnclosure
  flag?: ReactNode
  children?: ReactNode
}) {
  const me = useMe()
  const { zone } = me.facility
  const [recording, setRecording] = useState(false)
  const sayWhen = (at: string) => sayMoment(at, zone, water.asOf)
  const { enclosure } = water
  const bodies = orderedWaters([water.bodies])[0] ?? []
  const mayRecord = water.may.includes('water.record')
  const mayConfigure = water.may.includes('water.configure')
  const mayPropose = decide('water.configure', me.roles).allowed
  const hasWater = bodies.length > 0
  const codes = bodies.map((body) => body.code)
  const ownBodyId = enclosure.waterBodyId ?? ''

  return (
    <Sheet recipe="plain" className="enclosure-sheet">
      <Area>
        <div className="enclosure-head">
          <Cartouche
            place={
              <>
                <Link to={paths.water()}>{waterWords.title}</Link>
                {` / ${enclosure.area}`}
              </>
            }
            title={enclosure.code}
            source={[
              enclosure.name,
              waterWords.enclosureSource({
                kind: capital(enclosureKindNames[enclosure.kind]),
                boundary: enclosure.boundary,
              }),
              enclosure.description ?? '',
            ]
              .filter(Boolean)
              .join('. ')
              .replaceAll('..', '.')}
            flag={
              <>
                {flag}
                {mayConfigure ? (
                  <ButtonLink
                    size="small"
                    kind="plain"
                    icon={Pencil}
                    to={paths.editEnclosure(enclosure.code)}
                  >
                    {waterWords.edit}
                  </ButtonLink>
                ) : null}
              </>
            }
          />
          {mayRecord && hasWater ? (
            <div className="phone-acts">
              <ButtonLink kind="primary" size="touch" icon={Plus} to={paths.enclosureMeasure(enclosure.code)}>
                {readingWords.add}
              </ButtonLink>
              <Button size="touch" onClick={() => setRecording(true)}>
                {waterWords.recordEvent}
              </Button>
            </div>
          ) : null}
          <NetVolume water={water} zone={zone} volumeUnit={me.preferences['volumeUnit']} />
        </div>
        {hasWater ? (
          <Worksheet
            water={water}
            mayMeasure={mayPropose}
            mayOnlyPropose={mayPropose && !mayConfigure}
            sayWhen={sayWhen}
          />
        ) : null}
        {children}
        {hasWater ? (
          <>
            <section className="pane ink-pane stack">
              <h2 className="t-head">{waterWords.connectedWater}</h2>
              <ComputedLine
                what={
                  codes.length > 1
                    ? waterWords.joinedNow({ codes: codes.join(', ') })
                    : waterWords.ownWater({ code: enclosure.code })
                }
                from={waterWords.fromValves}
              />
              <p className="t-2">
                {water.enclosures
                  .filter((one) => one.id !== enclosure.id)
                  .map((one) => (
                    <Link key={one.id} to={paths.enclosure(one.code)} className="mr-3">
                      {`${one.code} ${one.name}`}
                    </Link>
                  ))}
              </p>
              <ValveRows
                rows={water.connections}
                mayRecord={mayRecord}
                volumeHolds={water.volume.holds}
                sayWhen={sayWhen}
              />
              <IsolationRows
                rows={water.isolations}
                bodies={bodies}
                mayRecord={mayRecord}
                sayWhen={sayWhen}
              />
            </section>
            <section className="pane ink-pane stack">
              <h2 className="t-head">{waterWords.lifeSupport}</h2>
              <LifeSupportRows rows={water.lifeSupport} mayRecord={mayRecord} sayWhen={sayWhen} />
            </section>
            <section className="pane ink-pane stack">
              <div className="row row-between row-wrap">
                <h2 className="t-head">{waterWords.events}</h2>
                {mayRecord ? (
                  <Button size="small" icon={Plus} onClick={() => setRecording(true)}>
                    {waterWords.recordEvent}
                  </Button>
                ) : null}
              </div>
              <EventRows rows={water.events} mayRecord={mayRecord} sayWhen={sayWhen} />
            </section>
          </>
        ) : null}
      </Area>
      <Area>
        {hasWater ? (
          <ReadingsPane water={water} mayRecord={mayRecord} mayConfigure={mayConfigure} sayWhen={sayWhen} />
        ) : null}
      </Area>
      {recording ? (
        <EventDialog
          bodies={bodies}
          machines={water.lifeSupport}
          ownBodyId={ownBodyId}
          onBack={() => setRecording(false)}
        />
      ) : null}
    </Sheet>
  )
}
