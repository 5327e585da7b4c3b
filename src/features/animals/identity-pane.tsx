import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { Animal } from '../../../shared/contracts/animals.contract.ts'
import { animalForms } from '../../../shared/messages/animal-forms.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import {
  identifierKindNames,
  sexNames,
  stageNames,
  taxonGroupNames,
} from '../../../shared/messages/animals.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { useMay } from '../../lib/may.ts'
import { paths } from '../../lib/paths.ts'
import { Button } from '../../ui/button.tsx'
import { DescribeDialog } from './describe-dialog.tsx'
import { FoodDialog } from './food-dialog.tsx'
import { EndMarkDialog, MarkDialog } from './mark-dialogs.tsx'

const birthKinds = () => ({ hatched: words.hatched, born: words.bornKind, propagated: words.propagated })

/** Who an animal is, as the registrar keeps it: description, marks, where it came from. */
export function IdentityPane({ animal, zone }: { animal: Animal; zone: string }) {
  const [open, setOpen] = useState<'describe' | 'mark' | 'food' | null>(null)
  const [ending, setEnding] = useState<Animal['identifiers'][number] | null>(null)
  const { allowed } = useMay('register.manage')
  const maySayFood = useMay('animal.say-food-or-release').allowed
  const { birth, foodOrRelease: food } = animal
  const marks = animal.identifiers.filter((mark) => mark.ended === null)
  const former = animal.identifiers.filter((mark) => mark.ended !== null)
  const close = () => setOpen(null)
  return (
    <section className="pane stack" aria-labelledby="who-it-is">
      <div className="row row-between">
        <h2 id="who-it-is" className="t-head">
          {words.who}
        </h2>
        {allowed ? (
          <Button size="small" onClick={() => setOpen('describe')}>
            {animalForms.describe}
          </Button>
        ) : null}
      </div>
      <dl className="facts">
        <dt>{words.taxonGroup}</dt>
        <dd>{taxonGroupNames[animal.taxon.group]}</dd>
        <dt>{words.sex}</dt>
        <dd>{sexNames[animal.sex]}</dd>
        <dt>{words.stage}</dt>
        <dd>{stageNames[animal.stage]}</dd>
        <dt>{words.born}</dt>
        <dd>
          {birth
            ? words.bornLine({
                kind: birthKinds()[birth.kind],
                date: sayDate(birth.date),
                about: birth.approximate,
              })
            : words.bornUnknown}
        </dd>
        <dt>{words.arrived}</dt>
        <dd>
          {animal.arrivedAt
            ? sayDate(animal.arrivedKnownOn ?? facilityDateOf(animal.arrivedAt, zone))
            : words.bornUnknown}
        </dd>
        <dt>{words.food}</dt>
        <dd>
          <span className="block">
            {food === null ? words.foodNotSaid : food.answer === 'yes' ? words.foodYes : words.foodNo}
          </span>
          {food === null ? null : (
            <span className="block t-note">
              {words.foodBy({
                by: food.recordedBy,
                on: sayDate(food.happenedOn),
                reason: food.reason,
                of: food.accession === animal.accession ? '' : food.accession,
              })}
            </span>
          )}
          {maySayFood ? (
            <Button kind="plain" size="small" onClick={() => setOpen('food')}>
              {animalForms.sayFood}
            </Button>
          ) : null}
        </dd>
        <dt>{words.marks}</dt>
        <dd>
          {marks.length === 0 ? words.noMarks : null}
          {marks.map((mark) => (
            <span key={mark.id} className="block">
              {identifierKindNames[mark.kind]} <b className="num">{mark.value}</b>
              {mark.place ? `, ${mark.place}` : ''}
              {allowed ? (
                <Button kind="plain" size="small" onClick={() => setEnding(mark)}>
                  {animalForms.endMark}
                </Button>
              ) : null}
            </span>
          ))}
          {former.map((mark) => (
            <span key={mark.id} className="block t-note">
              {words.markEnded({
                mark: `${identifierKindNames[mark.kind]} ${mark.value}`,
                on: sayDate(facilityDateOf(mark.ended?.at ?? mark.happenedAt, zone)),
                reason: mark.ended?.reason ?? '',
              })}
            </span>
          ))}
        </dd>
        {animal.splitFrom ? (
          <>
            <dt>{words.taken}</dt>
            <dd>
              <Link to={paths.animal(animal.splitFrom)}>{animal.splitFrom}</Link>
            </dd>
          </>
        ) : null}
        {animal.splitInto.length > 0 ? (
          <>
            <dt>{words.takenOut}</dt>
            <dd className="row row-wrap gap-x-2 gap-y-0">
              {animal.splitInto.map((accession) => (
                <Link key={accession} to={paths.animal(accession)}>
                  {accession}
                </Link>
              ))}
            </dd>
          </>
        ) : null}
      </dl>
      {allowed ? (
        <Button size="small" className="justify-self-start" onClick={() => setOpen('mark')}>
          {animalForms.addMark}
        </Button>
      ) : null}
      {open === 'describe' ? <DescribeDialog animal={animal} onBack={close} /> : null}
      {open === 'food' ? <FoodDialog animal={animal} onBack={close} /> : null}
      {open === 'mark' ? <MarkDialog animal={animal} onBack={close} /> : null}
      {ending ? (
        <EndMarkDialog accession={animal.accession} mark={ending} onBack={() => setEnding(null)} />
      ) : null}
    </section>
  )
}
