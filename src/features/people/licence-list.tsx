import { useState } from 'react'
import type { Licence, Person } from '../../../shared/contracts/people.contract.ts'
import { licenceStates, peopleWords } from '../../../shared/messages/people.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { Button } from '../../ui/button.tsx'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { LicenceForm } from './licence-form.tsx'
import { VoidLicenceDialog } from './void-licence-dialog.tsx'

/** Every licence ever entered, voided ones with their reason. */
export function LicenceList({
  person,
  onUnsaved,
}: {
  person: Person
  onUnsaved: (unsaved: boolean) => void
}) {
  const [voiding, setVoiding] = useState<Licence | null>(null)
  const [adding, setAdding] = useState(false)
  return (
    <section className="stack">
      <div className="row row-between row-wrap">
        <h2 className="t-head">{peopleWords.licences}</h2>
        {adding ? null : (
          <Button size="small" onClick={() => setAdding(true)}>
            {peopleWords.addLicence}
          </Button>
        )}
      </div>
      <p className="hint">{peopleWords.licencesHint}</p>
      {adding ? (
        <LicenceForm personId={person.id} onDone={() => setAdding(false)} onUnsaved={onUnsaved} />
      ) : null}
      {person.licences.length === 0 ? <p className="t-2">{peopleWords.noLicences}</p> : null}
      <ul className="stack">
        {person.licences.map((licence) => (
          <li key={licence.id} className="row row-between row-wrap border-b border-hair pb-2">
            <div>
              <FlagWords flag={licence.state === 'valid' ? 'C' : 'N'}>
                {`${licence.jurisdiction}, ${licence.number}: ${licenceStates[licence.state]}`}
              </FlagWords>
              <p className="t-2">{`${sayDate(licence.validFrom)} – ${sayDate(licence.validUntil)}`}</p>
              {licence.voidedReason ? <p className="t-2">{licence.voidedReason}</p> : null}
            </div>
            {licence.state === 'void' ? null : (
              <Button size="small" onClick={() => setVoiding(licence)}>
                {peopleWords.voidIt}
              </Button>
            )}
          </li>
        ))}
      </ul>
      {voiding ? (
        <VoidLicenceDialog personId={person.id} licence={voiding} onBack={() => setVoiding(null)} />
      ) : null}
    </section>
  )
}
