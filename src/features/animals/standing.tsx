import type { Animal, AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { FlagWords } from '../../ui/flag-mark.tsx'
import { Tag } from '../../ui/tag.tsx'
import { InWaterOfCases } from './water-in-quarantine.tsx'

/** How an animal stands, in one cell of a list: quarantine, hold, and what waits to be explained. */
export function Standing({ animal }: { animal: Pick<AnimalRow, 'lock' | 'openDiscrepancies'> }) {
  if (animal.lock === 'none' && animal.openDiscrepancies === 0) return null
  return (
    <span className="row row-wrap gap-2">
      {animal.lock === 'boundary' ? <FlagWords flag="Q">{words.inQuarantine}</FlagWords> : null}
      {animal.lock === 'all' ? <FlagWords flag="L">{words.held}</FlagWords> : null}
      {animal.openDiscrepancies > 0 ? (
        <Tag kind="solid">{words.toExplain({ count: animal.openDiscrepancies })}</Tag>
      ) : null}
    </span>
  )
}

/** The same on the sheet of one animal, with the words of what put it there. */
export function SheetFlag({ animal }: { animal: Animal }) {
  if (animal.place === null) return <Tag>{words.gone}</Tag>
  const held = animal.locks.find((lock) => lock.kind === 'all')
  const lock = held ?? animal.locks[0]
  if (!lock) return <InWaterOfCases enclosureId={animal.place.id} />
  const given = { source: lock.sourceLabel, reason: lock.reason }
  return (
    <FlagWords flag={held ? 'L' : 'Q'}>{held ? words.heldBy(given) : words.quarantinedBy(given)}</FlagWords>
  )
}
