import { useState } from 'react'
import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Animal, Discrepancy } from '../../../shared/contracts/animals.contract.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import {
  sensitivityLevelNames,
  sensitivityNames,
  sexNames,
  stageNames,
} from '../../../shared/messages/animals.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { AnimalLog } from './animal-log.tsx'
import { CountPane } from './count-pane.tsx'
import { DeathsDialog } from './deaths-dialog.tsx'
import { ExplainDialog } from './explain-dialog.tsx'
import { IdentityPane } from './identity-pane.tsx'
import { MoveDialog } from './move-dialog.tsx'
import { MovesPane } from './moves-pane.tsx'
import { animalQuery } from './queries.ts'
import { sayDiscrepancy } from './say-discrepancy.ts'
import { SheetFlag } from './standing.tsx'
import { WeighDialog } from './weigh-dialog.tsx'
import { WeightPane } from './weight-pane.tsx'

export interface AnimalSheetProps {
  accession: string
  /** What other features show of this animal: under the title block, and under the weight. */
  beside?: (animal: Animal) => ReactNode
  middle?: (animal: Animal) => ReactNode
}

/** The sheet of one animal or group: who it is, what it weighs, how many, where it has been, and its record. */
export function AnimalSheet({ accession, beside, middle }: AnimalSheetProps) {
  const { data: animal, error, isPending, refetch } = useQuery(animalQuery(accession))
  if (animal) return <Found animal={animal} beside={beside} middle={middle} />
  return (
    <Sheet recipe="plain">
      <Cartouche place={<Link to={paths.animals()}>{words.title}</Link>} title={accession} />
      <div className="pane">
        {isPending ? <ListFetching what={accession} /> : null}
        {isProblem(error, 'not-found') ? (
          <ListEmpty
            title={words.noSuchTitle}
            act={<ButtonLink to={paths.animals()}>{words.toList}</ButtonLink>}
          >
            {words.noSuch({ accession })}
          </ListEmpty>
        ) : isProblem(error) ? (
          <ListUnreadable
            title={words.fetchFailed}
            why={error.says}
            code={error.requestId}
            onRetry={() => void refetch()}
          />
        ) : null}
      </div>
    </Sheet>
  )
}

function Found({ animal, beside, middle }: { animal: Animal } & Pick<AnimalSheetProps, 'beside' | 'middle'>) {
  const { zone } = useMe().facility
  const today = useFacilityNow(zone)
  const [act, setAct] = useState<'weigh' | 'move' | 'deaths' | null>(null)
  const mayWeigh = useMay('weight.record')
  const mayMove = useMay('animal.move')
  const mayRecordDeath = useMay('observation.record')
  const back = () => setAct(null)
  // one reading for the whole sheet; it is read anew with every change of the minute
  const now = new Date().toISOString()
  const { place } = animal
  return (
    <Sheet recipe="record">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.animals()}>{words.title}</Link> / {animal.accession}
            </>
          }
          title={animal.name ? `${animal.name}, ${animal.taxon.commonName}` : animal.taxon.commonName}
          source={
            <>
              <i className="sci">{animal.taxon.scientificName}</i>
              {`, ${sexNames[animal.sex]}, ${stageNames[animal.stage]}. `}
              {place ? (
                <>
                  {`${words.enclosure} `}
                  <Link to={paths.enclosure(place.code)} className="num">
                    {place.code}
                  </Link>
                  {`, ${place.name}.`}
                </>
              ) : null}
            </>
          }
          flag={<SheetFlag animal={animal} />}
        />
        <div className="pane row row-wrap">
          {/* at the tank these come first; on a wide sheet they stand with what they change */}
          {mayWeigh.allowed ? (
            <Button kind="primary" className="min-[601px]:hidden" onClick={() => setAct('weigh')}>
              {words.weigh}
            </Button>
          ) : null}
          {mayMove.allowed && place ? (
            <Button className="min-[601px]:hidden" onClick={() => setAct('move')}>
              {words.move}
            </Button>
          ) : null}
          {place || animal.form === 'group' ? (
            <Button shut={mayRecordDeath.why ?? false} onClick={() => setAct('deaths')}>
              {animal.form === 'group' ? words.deaths : words.death}
            </Button>
          ) : null}
        </div>
        <Discrepancies rows={animal.discrepancies} />
        <Sensitivities animal={animal} />
        {beside?.(animal)}
        <IdentityPane animal={animal} zone={zone} />
      </Area>
      <Area>
        <WeightPane animal={animal} zone={zone} now={now} onWeigh={() => setAct('weigh')} />
        {middle?.(animal)}
        {animal.form === 'group' ? <CountPane animal={animal} zone={zone} now={now} /> : null}
        <MovesPane animal={animal} zone={zone} now={now} onMove={() => setAct('move')} />
      </Area>
      <AnimalLog accession={animal.accession} zone={zone} today={today.date} />
      {act === 'weigh' ? <WeighDialog animal={animal} onBack={back} /> : null}
      {act === 'move' ? <MoveDialog animal={animal} onBack={back} /> : null}
      {act === 'deaths' ? <DeathsDialog animal={animal} onBack={back} /> : null}
    </Sheet>
  )
}

function Sensitivities({ animal }: { animal: Animal }) {
  const avoided = animal.sensitivities.filter((one) => one.level !== 'tolerates')
  if (avoided.length === 0) return null
  return (
    <div className="pane">
      <CautionBlock level="warning" title={words.sensitivities}>
        {avoided.map((one) => (
          <span key={one.code} className="block">
            {sensitivityNames[one.code]}: {sensitivityLevelNames[one.level]}
            {one.note ? `. ${one.note}` : ''}
          </span>
        ))}
      </CautionBlock>
    </div>
  )
}

function Discrepancies({ rows }: { rows: readonly Discrepancy[] }) {
  const { roles } = useMe()
  const [open, setOpen] = useState<Discrepancy | null>(null)
  if (rows.length === 0) return null
  return (
    <section className="pane stack" aria-labelledby="to-explain">
      <h2 id="to-explain" className="t-head">
        {words.toExplainTitle}
      </h2>
      {rows.map((row) => (
        <div key={row.id} className="stack gap-2">
          <p>{sayDiscrepancy(row)}</p>
          {roles.includes(row.forRole) ? (
            <Button size="small" className="justify-self-start" onClick={() => setOpen(row)}>
              {words.explain}
            </Button>
          ) : (
            <p className="t-note">{words.forRole({ role: row.forRole })}</p>
          )}
        </div>
      ))}
      {open ? <ExplainDialog discrepancy={open} onBack={() => setOpen(null)} /> : null}
    </section>
  )
}
