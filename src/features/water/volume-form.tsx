import { useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { Plus } from 'lucide-react'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import type { VolumeMethod, VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'
import { methodWords, volumeWords } from '../../../shared/messages/volume-form.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { useCarried } from '../../lib/bench-carry.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ComputedLine } from '../../ui/computed-line.tsx'
import { Quantity } from '../../ui/quantity.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { MomentAndNote } from './moment-and-note.tsx'
import { draftOfCarried } from './carried-volume.ts'
import { CarriedVolume, noteOfCarried } from './carried-water.tsx'
import { useDetermineVolume } from './mutations.ts'
import { VolumeDrawing } from './volume-drawing.tsx'
import { volumeDrawing } from './volume-drawing-model.ts'
import {
  draftOfSheet,
  emptyDraft,
  emptyPart,
  emptyPipe,
  isDisplacementOpen,
  isUnfinished,
  sheetOf,
  workOut,
} from './volume-form-model.ts'
import type { VolumeDraft } from './volume-form-model.ts'
import { VolumeMethodFields } from './volume-method-fields.tsx'
import { VolumeWorking } from './volume-working.tsx'

const methods = ['geometry', 'metered', 'salt-dilution', 'stated'] as const satisfies readonly VolumeMethod[]

/**
 * Measuring the volume of an enclosure's water: measures at the left, the section drawing and the working at the right,
 * worked out as one types by the same engine as on the server, which works it out again.
 */
export function VolumeForm({ water, mayOnlyPropose }: { water: WaterOfEnclosure; mayOnlyPropose: boolean }) {
  const { code, treatmentVessel } = water.enclosure
  const me = useMe()
  const when = useMoment()
  const navigate = useNavigate()
  const say = useToast()
  const determine = useDetermineVolume(code)
  const refusal = useRefusal()
  const [id] = useState(newId)
  const [isolationId, setIsolationId] = useState('')
  const [nextCheckOn, setNextCheckOn] = useState('')
  const carried = useCarried('volume')
  const [startNote] = useState(() => (carried ? noteOfCarried(carried) : ''))
  const [note, setNote] = useState(startNote)
  const [tried, setTried] = useState(false)
  const [start] = useState<VolumeDraft>(() => {
    const empty = emptyDraft(water.bodies, treatmentVessel)
    if (carried) return draftOfCarried(carried.sheet as VolumeSheet, empty, code)
    const earlier = water.volume.volume?.sheet as VolumeSheet | undefined
    return earlier ? draftOfSheet(earlier, empty) : empty
  })
  const [draft, setDraft] = useState(start)
  const { blocker, letGo } = useLeaveGuard(
    // what the bench filled in is still there when one goes back to it
    note !== startNote || nextCheckOn !== '' || JSON.stringify(draft) !== JSON.stringify(start),
  )
  const lengthUnit = me.preferences['lengthUnit'] || 'm'
  const result = workOut(draft)
  const isolation = water.isolations.find((one) => one.id === isolationId)
  const covered = isolation ? isolation.waterBodyIds : water.bodies.map((body) => body.id)
  const codes = isolation ? isolation.codes : water.bodies.map((body) => body.code)
  const showsFaults = tried || (!result.ok && !isUnfinished(result.refusal))
  const wrong = (field: string) =>
    refusal.at(`/sheet/${field.replaceAll('.', '/')}`) ??
    (!result.ok && showsFaults && result.refusal.field === field
      ? sayNumberRefusal(result.refusal)
      : undefined)
  const drawing = result.ok ? volumeDrawing(sheetOf(draft), result.value.working) : null

  const send = async () => {
    setTried(true)
    if (!result.ok || when.instant === null || isDisplacementOpen(draft)) return
    const happenedAt = when.instant
    const done = await refusal.attempt(() =>
      determine.mutateAsync({
        id,
        happenedAt,
        waterBodyIds: [...covered],
        isolationId: isolation?.id ?? null,
        sheet: sheetOf(draft) as never,
        nextCheckOn: nextCheckOn || null,
        note: note.trim() || null,
      }),
    )
    if (!done) return
    say({ words: volumeWords.saved })
    letGo()
    void navigate(paths.enclosureVolumes(code))
  }

  return (
    <Sheet recipe="order" className="volume-sheet">
      <Area>
        <Cartouche
          place={
            <>
              <Link to={paths.water()}>{waterWords.title}</Link>
              {' / '}
              <Link to={paths.enclosure(code)}>{code}</Link>
            </>
          }
          title={volumeWords.title}
          source={volumeWords.source}
        />
        <div className="pane stack">
          <SelectField
            label={volumeWords.how}
            startsEmpty={false}
            options={methods.map((value) => ({ value, label: methodWords[value] }))}
            value={draft.method}
            onChange={(event) => setDraft({ ...draft, method: event.target.value as VolumeMethod })}
          />
          <p className="field">
            <span className="field-label">{volumeWords.covers}</span>
            <span>{codes.join(', ')}</span>
            <span className="hint">{volumeWords.coversHint}</span>
          </p>
          {water.isolations.length > 0 ? (
            <SelectField
              label={volumeWords.isolation}
              startsEmpty={false}
              options={[
                { value: '', label: volumeWords.noIsolation },
                ...water.isolations.map((one) => ({ value: one.id, label: one.codes.join(', ') })),
              ]}
              value={isolationId}
              onChange={(event) => setIsolationId(event.target.value)}
            />
          ) : null}
          <MomentAndNote
            inWords={when.inWords}
            moment={when.moment}
            onMoment={when.setMoment}
            momentWrong={when.missing ?? refusal.at('/happenedAt')}
            note={note}
            onNote={setNote}
          />
          <TextField
            label={volumeWords.nextCheck}
            optional
            type="date"
            value={nextCheckOn}
            onChange={(event) => setNextCheckOn(event.target.value)}
          />
        </div>
      </Area>
      <Area className="pane">
        {carried ? <CarriedVolume carried={carried} /> : null}
        <form
          id="volume-form"
          className="tank-form tank-form-wide"
          noValidate
          onSubmit={(event) => {
            event.preventDefault()
            void send()
          }}
        >
          <VolumeMethodFields draft={draft} onChange={setDraft} lengthUnit={lengthUnit} wrong={wrong} />
          {water.volume.volume && !carried && draft.method === 'geometry' ? (
            <ComputedLine what={volumeWords.lengthsKept} from={sayDate(water.volume.volume.happenedOn)} />
          ) : null}
          {draft.method === 'geometry' ? (
            <div className="row row-wrap">
              <Button
                size="small"
                icon={Plus}
                onClick={() =>
                  setDraft({
                    ...draft,
                    parts: [...draft.parts, emptyPart(freshKey(draft, 'tank'), 'tank', '')],
                  })
                }
              >
                {volumeWords.addTank}
              </Button>
              <Button
                size="small"
                icon={Plus}
                onClick={() =>
                  setDraft({
                    ...draft,
                    parts: [...draft.parts, emptyPart(freshKey(draft, 'sump'), 'sump', '')],
                  })
                }
              >
                {volumeWords.addSump}
              </Button>
              <Button
                size="small"
                icon={Plus}
                onClick={() =>
                  setDraft({ ...draft, pipes: [...draft.pipes, emptyPipe(freshKey(draft, 'pipe'))] })
                }
              >
                {volumeWords.addPipe}
              </Button>
            </div>
          ) : null}
        </form>
      </Area>
      <Area className="volume-result">
        <section className="net-volume" aria-live="polite">
          <h2 className="t-label">{volumeWords.result}</h2>
          {result.ok ? (
            <p>
              <Quantity
                of={formatVolumeWithError(result.value.netLitres, result.value.errorPercent)}
                size="dose"
              />
            </p>
          ) : (
            <>
              <p className="sea-name">{volumeWords.notYet}</p>
              {showsFaults ? <p>{sayNumberRefusal(result.refusal)}</p> : null}
            </>
          )}
          <p className="t-2">{volumeWords.waits}</p>
        </section>
        {drawing ? (
          <div className="px-4">
            <VolumeDrawing code={code} drawing={drawing} valves={[]} />
          </div>
        ) : null}
        {result.ok ? (
          <div className="pane">
            <VolumeWorking lines={result.value.working} />
          </div>
        ) : null}
        <div className="pane stack">
          <WrongSummary fields={[]} general={refusal.general(['/happenedAt'])} />
          <div className="form-foot">
            <Button
              kind="primary"
              size="touch"
              type="submit"
              form="volume-form"
              disabled={refusal.busy}
              shut={
                !result.ok
                  ? volumeWords.fillFirst
                  : isDisplacementOpen(draft)
                    ? volumeWords.sayDisplaced
                    : when.missing
              }
            >
              {mayOnlyPropose ? volumeWords.propose : volumeWords.record}
            </Button>
            <ButtonLink size="touch" to={paths.enclosure(code)}>
              {waterWords.back}
            </ButtonLink>
          </div>
        </div>
      </Area>
      <LeaveQuestion blocker={blocker} />
    </Sheet>
  )
}

/** A key that no part of the draft has: "tank-2". */
function freshKey(draft: VolumeDraft, word: string): string {
  const taken = new Set([...draft.parts, ...draft.pipes].map((part) => part.key))
  for (let i = 1; ; i++) if (!taken.has(`${word}-${String(i)}`)) return `${word}-${String(i)}`
}
