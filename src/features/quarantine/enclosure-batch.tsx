import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { AnimalRow } from '../../../shared/contracts/animals.contract.ts'
import { caseForms as words } from '../../../shared/messages/quarantine-forms.ts'
import { Button } from '../../ui/button.tsx'
import { animalListQuery } from '../animals/index.ts'
import { EnclosureChooser, everyEnclosure } from '../enclosures/index.ts'

const atMost = 200

/** Takes everybody in an enclosure into the batch at once. */
export function EnclosureBatch({ onAdd }: { onAdd: (animals: readonly AnimalRow[]) => void }) {
  const [enclosureId, setEnclosureId] = useState<string | null>(null)
  const { data: enclosures } = useQuery(everyEnclosure)
  const code = enclosures?.rows.find(({ id }) => id === enclosureId)?.code
  const { data } = useQuery({
    ...animalListQuery({ place: code, limit: atMost }),
    enabled: code !== undefined,
  })
  const there = code === undefined ? [] : (data?.rows ?? []).filter(({ place }) => place?.code === code)
  return (
    <div className="stack">
      <EnclosureChooser label={words.addEnclosure} value={enclosureId} onChange={setEnclosureId} />
      {code === undefined || !data ? null : there.length === 0 ? (
        <p className="t-2">{words.nobodyThere}</p>
      ) : (
        <Button
          className="justify-self-start"
          onClick={() => {
            onAdd(there)
            setEnclosureId(null)
          }}
        >
          {words.addEveryone}
        </Button>
      )}
    </div>
  )
}
