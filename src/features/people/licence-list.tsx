import { useState } from 'react'
import type { Licence, Person } from '../../../shared/contracts/people.contract.ts'
import { peopleWords as words } from '../../../shared/messages/people.ts'
import { Button } from '../../ui/button.tsx'
import { CorrectLicenceForm } from './correct-licence-form.tsx'
import { EndLicenceDialog } from './end-licence-dialog.tsx'
import { LicenceEntry } from './licence-entry.tsx'
import type { LicenceAct } from './licence-entry.tsx'
import { LicenceForm } from './licence-form.tsx'
import { VoidLicenceDialog } from './void-licence-dialog.tsx'

const isGone = ({ state }: Licence) => state === 'void' || state === 'superseded'

/** Every licence ever entered: those that stand, then the earlier entries, which stay readable. */
export function LicenceList({
  person,
  onUnsaved,
}: {
  person: Person
  onUnsaved: (unsaved: boolean) => void
}) {
  const [acting, setActing] = useState<{ act: LicenceAct; licence: Licence } | null>(null)
  const [adding, setAdding] = useState(false)
  const standing = person.licences.filter((one) => !isGone(one))
  const earlier = person.licences.filter(isGone)
  const done = () => setActing(null)
  const entry = (licence: Licence) => (
    <LicenceEntry
      key={licence.id}
      personId={person.id}
      licence={licence}
      onAct={(act) => setActing({ act, licence })}
    />
  )
  const line = (licence: Licence) =>
    acting?.act === 'correct' && acting.licence.id === licence.id ? (
      <li key={licence.id}>
        <CorrectLicenceForm personId={person.id} licence={licence} onDone={done} onUnsaved={onUnsaved} />
      </li>
    ) : (
      entry(licence)
    )
  return (
    <section className="stack" aria-labelledby="licences">
      <div className="row row-between row-wrap">
        <h2 id="licences" className="t-head">
          {words.licences}
        </h2>
        {adding ? null : (
          <Button size="small" onClick={() => setAdding(true)}>
            {words.addLicence}
          </Button>
        )}
      </div>
      <p className="hint">{words.licencesHint}</p>
      {adding ? (
        <LicenceForm personId={person.id} onDone={() => setAdding(false)} onUnsaved={onUnsaved} />
      ) : null}
      {standing.length === 0 ? <p className="t-2">{words.noLicences}</p> : null}
      <ul className="stack">{standing.map(line)}</ul>
      {earlier.length > 0 ? (
        <>
          <h3 className="t-label">{words.earlier({ count: earlier.length })}</h3>
          <ul className="stack">{earlier.map(entry)}</ul>
        </>
      ) : null}
      {acting?.act === 'void' ? (
        <VoidLicenceDialog personId={person.id} licence={acting.licence} onBack={done} />
      ) : null}
      {acting?.act === 'end' ? (
        <EndLicenceDialog personId={person.id} licence={acting.licence} onBack={done} />
      ) : null}
    </section>
  )
}
