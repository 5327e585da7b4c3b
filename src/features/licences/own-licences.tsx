import { useQuery } from '@tanstack/react-query'
import { LockKeyhole } from 'lucide-react'
import { getOwnLicences } from '../../../shared/contracts/people.contract.ts'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { ownSettingsWords as words } from '../../../shared/messages/own-settings.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { signingWords } from '../../../shared/messages/signing.ts'
import { api } from '../../lib/api-client.ts'
import { meKey } from '../../lib/query-client.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { Icon } from '../../ui/icon.tsx'
import { Papers } from '../documents/index.ts'
import { LicenceFacts } from './licence-facts.tsx'
import { useSigner } from './use-signer.ts'

const isGone = ({ state }: Licence) => state === 'void' || state === 'superseded'

/** One's own licences with their papers, what ends soon, and whether signing is locked. They are entered by an administrator. */
export function OwnLicences() {
  const { me, lockedUntil } = useSigner()
  const query = useQuery({
    queryKey: [...meKey, 'licences'],
    queryFn: ({ signal }) => api(getOwnLicences, { signal }),
  })
  const licences = query.data?.licences ?? []
  const earlier = licences.filter(isGone)
  const line = (licence: Licence) => (
    <li key={licence.id} className="stack gap-2 border-b border-hair pb-3">
      <LicenceFacts licence={licence} />
      {licence.documents.length > 0 ? <Papers papers={licence.documents} /> : null}
    </li>
  )
  return (
    <section className="pane stack" aria-labelledby="own-licences">
      <h2 id="own-licences" className="t-head">
        {words.licences}
      </h2>
      {lockedUntil === null ? null : (
        <p className="row items-start t-strong" role="status">
          <Icon of={LockKeyhole} />
          <span>{signingWords.locked({ until: sayInstant(lockedUntil, me.facility.zone) })}</span>
        </p>
      )}
      <QueryStanding query={query} what={words.licences} rows={2} />
      {query.data && licences.length === 0 ? <p className="t-2">{words.noLicence}</p> : null}
      <ul className="stack">{licences.filter((one) => !isGone(one)).map(line)}</ul>
      {earlier.length > 0 ? (
        <>
          <h3 className="t-label">{peopleWords.earlier({ count: earlier.length })}</h3>
          <ul className="stack">{earlier.map(line)}</ul>
        </>
      ) : null}
      {query.data ? <p className="hint">{words.licencesHint}</p> : null}
    </section>
  )
}
