import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { Check, Ruler } from 'lucide-react'
import type { Volume } from '../../../shared/contracts/water-facts.ts'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { volumeMethodNames } from '../../../shared/messages/water.ts'
import { volumeWords } from '../../../shared/messages/volume-form.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { ListEmpty } from '../../ui/list-states.tsx'
import { Quantity } from '../../ui/quantity.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { Tag } from '../../ui/tag.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useConfirmVolume, useVoidVolume } from './mutations.ts'
import { netVolumeText, volumeUnitOf } from './net-volume.tsx'
import { volumesQuery } from './queries.ts'
import { StrikeDialog } from './strike-dialog.tsx'
import { VolumeDrawing } from './volume-drawing.tsx'
import { volumeDrawing } from './volume-drawing-model.ts'
import { VolumeWorking, workingLinesOf } from './volume-working.tsx'

/** Every determination of an enclosure's volume: what each rests on, who confirmed it, and which one is in force. */
export function VolumeList({ water }: { water: WaterOfEnclosure }) {
  const { code } = water.enclosure
  const query = useQuery(volumesQuery(code))
  const mayMeasure = useMay('water.configure')
  const inForce = water.volume.usable ? water.volume.volume?.id : undefined
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.water()}>{waterWords.title}</Link>
              {' / '}
              <Link to={paths.enclosure(code)}>{code}</Link>
            </>
          }
          title={volumeWords.versionsTitle}
          source={volumeWords.versionsSource}
        />
        {mayMeasure.allowed ? (
          <div className="pane">
            <ButtonLink kind="primary" icon={Ruler} to={paths.enclosureVolume(code)}>
              {volumeWords.title}
            </ButtonLink>
          </div>
        ) : null}
      </Area>
      <Area>
        <div className="px-4">
          <QueryStanding query={query} what={volumeWords.versionsTitle} />
        </div>
        {query.data?.length === 0 ? (
          <div className="px-4">
            <ListEmpty title={volumeWords.noVersions} />
          </div>
        ) : null}
        {query.data?.map((volume) => (
          <OneVolume key={volume.id} code={code} volume={volume} isInForce={volume.id === inForce} />
        ))}
      </Area>
    </Sheet>
  )
}

function OneVolume({ code, volume, isInForce }: { code: string; volume: Volume; isInForce: boolean }) {
  const me = useMe()
  const mayConfirm = useMay('volume.confirm')
  const mayConfigure = useMay('water.configure')
  const withdraw = useVoidVolume()
  const [asked, setAsked] = useState<'confirm' | 'withdraw' | null>(null)
  const text = netVolumeText(volume, volumeUnitOf(me.preferences['volumeUnit']))
  const own = volume.determinedById === me.id
  const mayWithdraw =
    mayConfigure.allowed && (mayConfigure.conditions.length === 0 || (own && !volume.confirmation))
  const lines = workingLinesOf(volume.working)
  const drawing = volumeDrawing(volume.sheet as unknown as VolumeSheet, lines)
  const valves = volume.valves.map((valve) =>
    (valve.open ? volumeWords.valveOpen : volumeWords.valveShut)(valve),
  )
  return (
    <section className="pane ink-pane stack" aria-label={text.text}>
      <div className="row row-between row-wrap">
        <p className={volume.voided ? 'line-through' : undefined}>
          <Quantity of={text} size="mid" />
        </p>
        <span className="row row-wrap">
          {isInForce ? <Tag kind="solid">{volumeWords.inForce}</Tag> : null}
          {volume.voided ? null : volume.confirmation ? (
            <Tag kind="done">{volumeWords.confirmed}</Tag>
          ) : (
            <Tag>{volumeWords.waiting}</Tag>
          )}
        </span>
      </div>
      <p className="t-2">
        {[
          volumeWords.foundBy({
            by: volume.recordedBy,
            on: sayDate(volume.happenedOn),
            method: volumeMethodNames[volume.method],
          }),
          waterWords.covers({ codes: volume.codes.join(', ') }),
          valves.length > 0 ? volumeWords.valvesThen({ list: valves.join(', ') }) : volumeWords.noValves,
          volume.note ?? '',
        ]
          .filter(Boolean)
          .join(' ')}
      </p>
      {volume.confirmation ? (
        <p>
          {volumeWords.confirmedBy({
            by: volume.confirmation.by,
            on: sayDate(facilityDateOf(volume.confirmation.at, me.facility.zone)),
          })}
        </p>
      ) : null}
      {volume.voided ? (
        <p>{volumeWords.withdrawnBy({ by: volume.voided.by, reason: volume.voided.reason })}</p>
      ) : null}
      <details open={!volume.confirmation && !volume.voided}>
        <summary>{volumeWords.showWorking}</summary>
        {drawing ? (
          <div className="overflow-x-auto">
            <div className="min-w-[560px]">
              <VolumeDrawing code={code} drawing={drawing} valves={[]} />
            </div>
          </div>
        ) : null}
        <VolumeWorking lines={lines} />
      </details>
      {volume.voided ? null : (
        <div className="row row-wrap">
          {volume.confirmation || !mayConfirm.allowed ? null : (
            <Button
              kind="primary"
              icon={Check}
              shut={own && volumeWords.confirmOwn}
              onClick={() => setAsked('confirm')}
            >
              {volumeWords.confirm}
            </Button>
          )}
          {mayWithdraw ? <Button onClick={() => setAsked('withdraw')}>{volumeWords.withdraw}</Button> : null}
        </div>
      )}
      {asked === 'confirm' ? (
        <ConfirmDialog code={code} volume={volume} text={text.text} onBack={() => setAsked(null)} />
      ) : null}
      {asked === 'withdraw' ? (
        <StrikeDialog
          question={volumeWords.withdrawQuestion({ volume: text.text })}
          hint={volumeWords.withdrawHint}
          act={volumeWords.withdraw}
          onBack={() => setAsked(null)}
          onStrike={(given) => withdraw.mutateAsync({ id: volume.id, ...given })}
        />
      ) : null}
    </section>
  )
}

function ConfirmDialog({
  code,
  volume,
  text,
  onBack,
}: {
  code: string
  volume: Volume
  text: string
  onBack: () => void
}) {
  const confirm = useConfirmVolume()
  const refusal = useRefusal()
  const [key] = useState(newId)
  const [note, setNote] = useState('')
  const [differenceSeen, setDifferenceSeen] = useState(false)
  const send = async () => {
    const given = {
      id: volume.id,
      note: note.trim() || null,
      key,
      ...(differenceSeen ? { differenceSeen } : {}),
    }
    if (await refusal.attempt(() => confirm.mutateAsync(given))) onBack()
  }
  return (
    <Dialog
      question={volumeWords.confirmQuestion({ volume: text, code })}
      onBack={onBack}
      typed={note !== ''}
      acts={
        <>
          <Button kind="primary" disabled={refusal.busy} onClick={() => void send()}>
            {volumeWords.confirm}
          </Button>
          <Button onClick={onBack}>{waterWords.back}</Button>
        </>
      }
    >
      <div className="stack">
        <WrongSummary fields={[]} general={refusal.general([])} />
        <p className="t-2">{volumeWords.confirmHint}</p>
        {refusal.was('volume-differs') || differenceSeen ? (
          <Tick
            label={volumeWords.differenceSeen}
            checked={differenceSeen}
            onChange={(event) => setDifferenceSeen(event.target.checked)}
          />
        ) : null}
        <TextField
          label={waterWords.note}
          optional
          maxLength={2000}
          value={note}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
    </Dialog>
  )
}
