import { LockKeyhole } from 'lucide-react'
import { sayLacks, signingWords as words } from '../../../shared/messages/signing.ts'
import { sayDate, sayInstant } from '../../../shared/messages/say-date.ts'
import type { May } from '../../lib/may.ts'
import { Icon } from '../../ui/icon.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { LicenceNoticeLine } from './licence-notice-line.tsx'
import type { ShownLicence } from './signer-model.ts'
import type { Signer } from './use-signer.ts'

const printed = ({ jurisdiction, number, of }: ShownLicence) => ({
  jurisdiction,
  number,
  until: sayDate(of.lastDay),
})

/**
 * Who signs, with the licence that will stand under it: the only one, or the one to be chosen of several; a registration
 * where one is asked for; what lacks, and a lock, in words.
 */
export function SignerLines({ signer, may }: { signer: Signer; may: May }) {
  const { me, choices, licence, registration, lacks, lockedUntil, schedule } = signer
  // to whoever signs nothing in any of their roles, licences are no matter
  if (!may.allowed && !me.roles.includes('veterinarian'))
    return (
      <>
        <b>{me.printedName}</b>
        <p className="text-ink">{may.why}</p>
      </>
    )
  return (
    <div className="stack gap-2">
      <b>{me.printedName}</b>
      {choices.length > 1 ? (
        <SelectField
          label={words.chooseLicence}
          hint={words.chooseHint}
          value={licence?.id ?? ''}
          options={choices.map((one) => ({ value: one.id, label: words.licence(printed(one)) }))}
          onChange={({ target }) => signer.choose(target.value)}
        />
      ) : licence ? (
        <span>{words.licence(printed(licence))}</span>
      ) : null}
      {registration ? <span>{words.registration(printed(registration))}</span> : null}
      {[licence, registration].map((one) =>
        one?.of.warning ? <LicenceNoticeLine key={one.id} licence={one.of} /> : null,
      )}
      {schedule === null ? null : <p>{words.scheduleOf({ schedule })}</p>}
      {lacks.length > 0 ? (
        <p className="text-ink" role="status">
          {sayLacks(lacks)}
        </p>
      ) : null}
      {lockedUntil === null ? null : (
        <p className="row items-start text-ink" role="status">
          <Icon of={LockKeyhole} />
          <span>{words.locked({ until: sayInstant(lockedUntil, me.facility.zone) })}</span>
        </p>
      )}
    </div>
  )
}
