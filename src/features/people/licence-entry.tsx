import { attachLicenceDocument } from '../../../shared/contracts/people.contract.ts'
import type { Licence } from '../../../shared/contracts/people.contract.ts'
import { peopleWords as words } from '../../../shared/messages/people.ts'
import { Button } from '../../ui/button.tsx'
import { Papers } from '../documents/index.ts'
import { LicenceFacts } from '../licences/index.ts'
import { peopleKey } from './queries.ts'

export type LicenceAct = 'correct' | 'end' | 'void'

/** One licence of a person with its papers, and what can still be done with it. */
export function LicenceEntry({
  personId,
  licence,
  onAct,
}: {
  personId: string
  licence: Licence
  onAct: (act: LicenceAct) => void
}) {
  const isGone = licence.state === 'void' || licence.state === 'superseded'
  const acts: [act: LicenceAct, words: string][] = [
    ['correct', words.correct],
    ...(licence.ended === null ? [['end', words.end] as [LicenceAct, string]] : []),
    ['void', words.voidIt],
  ]
  return (
    <li className="stack gap-2 border-b border-hair pb-3">
      <LicenceFacts licence={licence} />
      {isGone && licence.documents.length === 0 ? null : (
        <Papers
          papers={licence.documents}
          mayAttach={!isGone}
          target={{
            contract: attachLicenceDocument,
            params: { id: personId, licenceId: licence.id },
            readAgain: peopleKey,
          }}
        />
      )}
      {isGone ? null : (
        <div className="row row-wrap">
          {acts.map(([act, says]) => (
            <Button
              key={act}
              size="small"
              aria-label={words.of({ act: says, number: licence.number })}
              onClick={() => onAct(act)}
            >
              {says}
            </Button>
          ))}
        </div>
      )}
    </li>
  )
}
