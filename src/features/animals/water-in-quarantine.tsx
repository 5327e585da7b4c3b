import { useQuery } from '@tanstack/react-query'
import { animalForms as words } from '../../../shared/messages/animal-forms.ts'
import { animalWords } from '../../../shared/messages/animal-sheet.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { casesInWaterQuery } from './queries.ts'

/**
 * Said before an animal is put into an enclosure: which cases are in its water, and what that does to their clocks.
 *
 * @param own numbers of the cases that the animal is of: to them it is no addition
 */
export function WaterInQuarantine({
  enclosureId,
  own = [],
}: {
  enclosureId: string | null
  own?: readonly string[]
}) {
  const { data = [] } = useQuery({ ...casesInWaterQuery(enclosureId ?? ''), enabled: Boolean(enclosureId) })
  const others = data.filter(({ number }) => !own.includes(number))
  return (
    <div role="status" className="stack gap-2 empty:hidden">
      {others.map(({ number, batchClosed }) => (
        <FlagWords key={number} flag="Q">
          {batchClosed ? words.restartsClock({ number }) : words.joinsOpenBatch({ number })}
        </FlagWords>
      ))}
    </div>
  )
}

/** On the sheet of an animal that is of no case: the cases whose water it is in. */
export function InWaterOfCases({ enclosureId }: { enclosureId: string }) {
  const { data = [] } = useQuery(casesInWaterQuery(enclosureId))
  if (data.length === 0) return null
  const numbers = data.map(({ number }) => number).join(', ')
  return <FlagWords flag="Q">{animalWords.inWaterOf({ numbers })}</FlagWords>
}
