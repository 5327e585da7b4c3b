import { useState } from 'react'
import type { ReactNode } from 'react'
import { signCodes } from '../../../shared/domain/observations/observation.ts'
import { signWords } from '../../../shared/messages/observations.ts'
import { observationWords as words } from '../../../shared/messages/observation-screens.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { classNames } from '../../ui/class-names.ts'
import { Stepper } from '../../ui/stepper.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { isAllWell, isCountOpen, toggleAllWell } from './observation-draft.ts'
import type { ObservationDraft } from './observation-draft.ts'

export interface AnimalHere {
  accession: string
  name: string
  form: 'individual' | 'group'
  count: number
}

interface FieldsProps {
  draft: ObservationDraft
  onChange: (next: ObservationDraft) => void
  animals: readonly AnimalHere[]
}

/** The whole round at one enclosure: big choices first, typing last. */
export function RoundFields({ draft, onChange, animals }: FieldsProps) {
  const set = (change: Partial<ObservationDraft>) => onChange({ ...draft, ...change })
  const well = isAllWell(draft)
  return (
    <>
      <button
        type="button"
        className={classNames('all-well', well && 'is-said')}
        aria-pressed={well}
        onClick={() => onChange(toggleAllWell(draft))}
      >
        <span>
          <b>{words.allWell}</b>
          {words.allWellNo}
        </span>
        <small>{well ? words.allWellUndo : words.allWellSays}</small>
      </button>
      <ChoiceField
        label={words.appetite}
        touch
        segments={[
          { value: 'all', label: words.ateAll },
          { value: 'some', label: words.ateSome },
          { value: 'none', label: words.ateNone },
        ]}
        value={draft.feeding}
        onChange={(feeding) => set({ feeding })}
      />
      <ChoiceField
        label={words.breathing}
        touch
        segments={[
          { value: 'normal', label: words.breathNormal },
          { value: 'fast', label: words.breathFast },
          { value: 'not-seen', label: words.notSeen },
        ]}
        value={draft.breathing}
        onChange={(breathing) => set({ breathing })}
      />
      <ChoiceField
        label={words.skin}
        touch
        segments={[
          { value: 'clean', label: words.skinClean },
          { value: 'marks', label: words.skinMarks },
          { value: 'not-seen', label: words.notSeen },
        ]}
        value={draft.skin}
        onChange={(skin) => set({ skin })}
      />
      <CountFields draft={draft} onChange={onChange} animals={animals} />
      <Stepper label={words.foundDead} value={draft.foundDead} onChange={(foundDead) => set({ foundDead })} />
      <WhoseFields draft={draft} onChange={onChange} animals={animals} />
      <StrengthFields draft={draft} onChange={onChange} />
    </>
  )
}

/** What a bath asks of the animals before it begins: how many are weak, and whether they were disturbed. */
function StrengthFields({ draft, onChange }: Omit<FieldsProps, 'animals'>) {
  const { unwell, handled } = draft
  const said = Number(unwell !== null) + Number(handled !== null)
  return (
    <Folded heading={words.strength} said={said > 0 ? words.strengthSaid({ count: said }) : null}>
      <div className="stack gap-4 pt-3">
        <p className="hint">{words.strengthHint}</p>
        <Stepper
          label={words.unwell}
          value={unwell}
          onChange={(count) => onChange({ ...draft, unwell: count })}
        />
        <ChoiceField
          label={words.handled}
          touch
          segments={[
            { value: 'no', label: words.handledNo },
            { value: 'yes', label: words.handledYes },
          ]}
          value={handled === null ? null : handled ? 'yes' : 'no'}
          onChange={(next) => onChange({ ...draft, handled: next === 'yes' })}
        />
      </div>
    </Folded>
  )
}

/** Fields that not every look needs, folded away; what was said in them stands beside the heading, and opens them at first. */
function Folded({ heading, said, children }: { heading: string; said: string | null; children: ReactNode }) {
  const [open, setOpen] = useState(said !== null)
  return (
    <details open={open} onToggle={({ currentTarget }) => setOpen(currentTarget.open)}>
      <summary className="signs-summary">
        {heading}
        {said === null ? '' : `: ${said}`}
      </summary>
      {children}
    </details>
  )
}

function CountFields({ draft, onChange, animals }: FieldsProps) {
  const set = (change: Partial<ObservationDraft>) => onChange({ ...draft, ...change })
  const ledger = animals.reduce((sum, { count }) => sum + count, 0)
  const { countBasis } = draft
  const wrong = isCountOpen(draft) && draft.countLow !== '' ? words.typeCount : undefined
  const number = (label: string, value: string, name: 'countLow' | 'countHigh') => (
    <TextField
      label={label}
      inputMode="numeric"
      autoComplete="off"
      value={value}
      maxLength={8}
      hint={words.countHint({ count: ledger })}
      wrong={wrong}
      onChange={({ target }) => set({ [name]: target.value })}
    />
  )
  return (
    <>
      <ChoiceField
        label={words.animals}
        touch
        segments={[
          { value: 'counted', label: words.counted },
          { value: 'estimated', label: words.estimated },
          { value: 'not-counted', label: words.notCounted },
        ]}
        value={countBasis}
        onChange={(next) => set({ countBasis: next })}
      />
      {countBasis === 'counted' ? number(words.howMany, draft.countLow, 'countLow') : null}
      {countBasis === 'estimated' ? (
        <div className="grid grid-cols-2 gap-3">
          {number(words.atLeast, draft.countLow, 'countLow')}
          {number(words.atMost, draft.countHigh, 'countHigh')}
        </div>
      ) : null}
    </>
  )
}

/** Whose the bodies are, where more than one animal or group is in the enclosure. */
function WhoseFields({ draft, onChange, animals }: FieldsProps) {
  const { foundDead, deadOf } = draft
  if ((foundDead ?? 0) === 0 || animals.length < 2) return null
  const named = Object.values(deadOf).reduce((sum, count) => sum + count, 0)
  return (
    <fieldset className="stack gap-3">
      <legend className="field-label">{words.whose}</legend>
      <p className="hint">{words.whoseHint}</p>
      {animals.map(({ accession, name }) => (
        <Stepper
          key={accession}
          label={`${accession}, ${name}`}
          value={deadOf[accession] ?? null}
          max={(foundDead ?? 0) - named + (deadOf[accession] ?? 0)}
          onChange={(count) => onChange({ ...draft, deadOf: { ...deadOf, [accession]: count } })}
        />
      ))}
    </fieldset>
  )
}

/** Signs, words and the mark for the veterinarian: what anybody may say. */
export function WordsFields({ draft, onChange }: Omit<FieldsProps, 'animals'>) {
  const set = (change: Partial<ObservationDraft>) => onChange({ ...draft, ...change })
  return (
    <>
      <Folded
        heading={words.signs}
        said={draft.signs.length > 0 ? words.signsChosen({ count: draft.signs.length }) : null}
      >
        <div className="signs">
          {signCodes.map((sign) => (
            <Tick
              key={sign}
              label={signWords[sign]}
              checked={draft.signs.includes(sign)}
              onChange={({ target }) =>
                set({
                  signs: target.checked
                    ? [...draft.signs, sign]
                    : draft.signs.filter((other) => other !== sign),
                })
              }
            />
          ))}
        </div>
      </Folded>
      <TextareaField
        label={words.wordsLabel}
        value={draft.words}
        maxLength={2000}
        rows={2}
        onChange={({ target }) => set({ words: target.value })}
      />
      <Tick
        label={words.forVeterinarian}
        hint={words.forVeterinarianHint}
        checked={draft.forVeterinarian}
        onChange={({ target }) => set({ forVeterinarian: target.checked })}
      />
    </>
  )
}
