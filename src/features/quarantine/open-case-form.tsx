import { useState } from 'react'
import { useQuery, useQueryClient } from '@tanstack/react-query'
import { Link, useNavigate } from 'react-router-dom'
import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import type { ProtocolVersion } from '../../../shared/contracts/protocols.contract.ts'
import { closeCase } from '../../../shared/contracts/quarantine.contract.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { quarantineWords } from '../../../shared/messages/quarantine-screens.ts'
import { sayOffset } from '../../../shared/messages/say-date.ts'
import { api } from '../../lib/api-client.ts'
import { instantOfMoment } from '../../lib/local-moment.ts'
import { useMay } from '../../lib/may.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useMoment } from '../../lib/use-moment.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { MomentField } from '../../ui/moment-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { BatchAnimalChooser } from './batch-animal-chooser.tsx'
import { EnclosureBatch } from './enclosure-batch.tsx'
import { useOpenCase } from './mutations.ts'
import { protocolsQuery, quarantineKey } from './queries.ts'

/** One animal or group of the batch, with when it came in; empty is the beginning of its stay. */
export interface BatchLine {
  id: string
  accession: string
  name: string
  place: string | null
  entered: string
}

const lineOf = (animal: AnimalRow): BatchLine => ({
  id: newId(),
  accession: animal.accession,
  name: animal.name ? `${animal.taxon.commonName}, ${animal.name}` : animal.taxon.commonName,
  place: animal.place?.code ?? null,
  entered: '',
})

const states: Record<ProtocolVersion['state'], () => string> = {
  confirmed: () => words.protocolConfirmed,
  default: () => words.protocolDefault,
  proposed: () => words.protocolProposed,
}

/** Opens a case for a batch: who is in it, under which protocol, from when, and whether it is complete. */
export function OpenCaseForm() {
  const may = useMay('case.open')
  const when = useMoment()
  const open = useOpenCase()
  const refusal = useRefusal()
  const navigate = useNavigate()
  const toast = useToast()
  const client = useQueryClient()
  const { data: protocols = [] } = useQuery(protocolsQuery)
  const [ids] = useState(() => ({ id: newId(), closing: newId() }))
  const [name, setName] = useState('')
  const [protocolId, setProtocolId] = useState('')
  const [batch, setBatch] = useState<readonly BatchLine[]>([])
  const [complete, setComplete] = useState<'yes' | 'no' | null>(null)
  /** The case is open and its closing was refused: that is said here, and the way to the case. */
  const [halfDone, setHalfDone] = useState<{ number: string; says: string } | null>(null)
  const { blocker, letGo } = useLeaveGuard(
    halfDone === null && (name !== '' || protocolId !== '' || batch.length > 0),
  )
  const offered = protocols.filter(({ current }) => current)
  const chosen = offered.find(({ id }) => id === protocolId)

  const shut =
    may.why ??
    (chosen === undefined
      ? words.chooseProtocol
      : batch.length === 0
        ? words.chooseBatch
        : complete === null
          ? words.chooseClosed
          : when.missing)

  const send = async () => {
    if (when.instant === null) return
    const happenedAt = when.instant
    let number = ''
    const done = await refusal.attempt(async () => {
      const opened = await open.mutateAsync({
        id: ids.id,
        protocolVersionId: protocolId,
        ...(typedText(name) === undefined ? {} : { name: typedText(name) }),
        members: batch.map(({ id, accession, entered }) => {
          const at = entered === '' ? null : instantOfMoment(entered, when.zone)
          return { id, accession, ...(at === null ? {} : { happenedAt: at }) }
        }),
        happenedAt,
      })
      number = opened.number
    })
    if (!done) return
    if (complete === 'yes') {
      try {
        await api(closeCase, { params: { number }, body: { id: ids.closing, happenedAt } })
      } catch (error) {
        if (!isProblem(error)) throw error
        return setHalfDone({ number, says: error.says })
      }
      await client.invalidateQueries({ queryKey: quarantineKey })
    }
    toast({ words: words.opened({ number }) })
    letGo()
    await navigate(paths.quarantineCase(number))
  }

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.quarantine()}>{quarantineWords.title}</Link>}
          title={words.openTitle}
          source={words.openSource}
        />
      </Area>
      <Area className="pane">
        {halfDone ? (
          <div className="stack" role="alert">
            <p>
              {words.notClosed} {halfDone.says}
            </p>
            <Link to={paths.quarantineCase(halfDone.number)}>
              {words.toCase({ number: halfDone.number })}
            </Link>
          </div>
        ) : (
          <form
            className="stack max-w-[64ch]"
            noValidate
            onSubmit={(event) => {
              event.preventDefault()
              if (shut === undefined && !refusal.busy) void send()
            }}
          >
            <WrongSummary fields={[]} general={refusal.general(['/happenedAt', '/name'])} />
            <SelectField
              label={words.openProtocol}
              hint={
                chosen
                  ? words.protocolHint({
                      days: chosen.content.policy.requiredDays,
                      steps: chosen.content.steps.length,
                      state: states[chosen.state](),
                    })
                  : undefined
              }
              options={offered.map(({ id, code, name: title }) => ({
                value: id,
                label: `${code}, ${title}`,
              }))}
              value={protocolId}
              onChange={({ target }) => setProtocolId(target.value)}
            />
            <BatchLines
              batch={batch}
              onChange={setBatch}
              onAdd={(animals) =>
                setBatch((before) => [
                  ...before,
                  ...animals
                    .filter(({ accession }) => before.every((line) => line.accession !== accession))
                    .map(lineOf),
                ])
              }
            />
            <MomentField
              label={words.openWhen}
              hint={sayOffset(new Date().toISOString(), when.zone)}
              value={when.moment}
              wrong={when.missing ?? refusal.at('/happenedAt')}
              onChange={when.setMoment}
            />
            <ChoiceField
              label={words.openClosed}
              hint={words.openClosedHint}
              segments={[
                { value: 'yes', label: words.lastIsIn },
                { value: 'no', label: words.moreToCome },
              ]}
              value={complete}
              onChange={setComplete}
            />
            <TextField
              label={words.openName}
              optional
              hint={words.openNameHint}
              wrong={refusal.at('/name')}
              value={name}
              maxLength={120}
              onChange={({ target }) => setName(target.value)}
            />
            <div>
              <Button type="submit" kind="primary" disabled={refusal.busy} shut={shut ?? false}>
                {words.openAct}
              </Button>
            </div>
          </form>
        )}
      </Area>
      <LeaveQuestion blocker={blocker} />
    </Sheet>
  )
}

function BatchLines({
  batch,
  onChange,
  onAdd,
}: {
  batch: readonly BatchLine[]
  onChange: (next: readonly BatchLine[]) => void
  onAdd: (animals: readonly AnimalRow[]) => void
}) {
  const [round, setRound] = useState(0)
  return (
    <fieldset className="stack">
      <legend className="t-head">{words.openBatch}</legend>
      <p className="hint">{words.openBatchHint}</p>
      {batch.length === 0 ? <p className="t-2">{words.noneYet}</p> : null}
      {batch.map((line) => (
        <div key={line.id} className="batch-line">
          <span>
            <b className="t-strong">{line.accession}</b> {line.name}
            {line.place === null ? null : <span className="t-2"> {words.inPlace({ code: line.place })}</span>}
          </span>
          <MomentField
            label={words.entry}
            hint={words.memberWhenHint}
            value={line.entered}
            onChange={(entered) =>
              onChange(batch.map((one) => (one.id === line.id ? { ...one, entered } : one)))
            }
          />
          <Button
            size="small"
            aria-label={words.removeAnimal({ accession: line.accession })}
            onClick={() => onChange(batch.filter((one) => one.id !== line.id))}
          >
            {words.remove}
          </Button>
        </div>
      ))}
      <BatchAnimalChooser
        key={round}
        label={words.addAnimal}
        without={batch.map(({ accession }) => accession)}
        onChoose={(animal) => {
          if (!animal) return
          onAdd([animal])
          setRound(round + 1)
        }}
      />
      <EnclosureBatch onAdd={onAdd} />
    </fieldset>
  )
}
