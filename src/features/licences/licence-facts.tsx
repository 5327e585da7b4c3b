import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { licenceStates, peopleWords as words } from '../../../shared/messages/people.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { licenceClassNames } from '../../../shared/messages/signing.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { LicenceNoticeLine } from './licence-notice-line.tsx'

/** What is recorded of one licence, and what it is worth today. */
export function LicenceFacts({ licence }: { licence: Licence }) {
  const { ended } = licence
  return (
    <div>
      <FlagWords flag={licence.state === 'valid' ? 'C' : 'N'}>
        {words.licenceLine({
          jurisdiction: licence.jurisdiction,
          number: licence.number,
          state: licenceStates[licence.state],
        })}
      </FlagWords>
      <p>{licenceClassNames[licence.class]}</p>
      {licence.class === 'controlled-substance' ? <p className="t-note">{words.registrationHint}</p> : null}
      <p className="t-2">
        {words.period({ from: sayDate(licence.validFrom), until: sayDate(licence.validUntil) })}
      </p>
      <LicenceNoticeLine licence={licence} />
      {ended ? (
        <p className="t-2">
          {words.endedLine({ on: sayDate(ended.on), reason: ended.reason, by: ended.by })}
        </p>
      ) : null}
      {licence.reason === null ? null : <p className="t-2">{words.corrects({ reason: licence.reason })}</p>}
      {licence.voidedReason === null ? null : (
        <p className="t-2">{words.voided({ reason: licence.voidedReason })}</p>
      )}
    </div>
  )
}
