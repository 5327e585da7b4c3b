import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { benchEnclosureWords as words } from '../../../shared/messages/bench-enclosure.ts'
import { useMay } from '../../lib/may.ts'
import { Button } from '../../ui/button.tsx'
import { EnclosureChooser } from '../enclosures/index.ts'
import { fillableInputs } from './enclosure-figures.ts'
import type { FieldNote } from './enclosure-figures.ts'
import type { EnclosureWater } from './use-enclosure-water.ts'

/** Chooses the enclosure whose water fills fields; not there where no field could be filled, or none may be read. */
export function EnclosureField({ of, water }: { of: AnyCalculator; water: EnclosureWater }) {
  const may = useMay('collection.read')
  if (!may.allowed || fillableInputs(of).length === 0) return null
  return (
    <EnclosureChooser
      optional
      label={words.choose}
      hint={water.asking ? words.asking : words.chooseHint}
      wrong={water.wrong}
      value={water.id}
      onChange={(id) => void water.choose(id)}
    />
  )
}

/** Where a figure comes from and how old it is. */
export function FillNote({ note }: { note: FieldNote }) {
  return (
    <span className="bench-found">
      {note.says}
      {note.old ? <strong className="text-magenta"> {note.old}</strong> : null}
    </span>
  )
}

/** Puts the figure of the enclosure into a field that holds another. */
export function TakeFigure({
  field,
  take,
  onTake,
}: {
  field: string
  take: NonNullable<FieldNote['take']>
  onTake: () => void
}) {
  return (
    <Button
      size="small"
      kind="plain"
      aria-label={words.takeFor({ shown: take.shown, field })}
      onClick={onTake}
    >
      {words.take({ shown: take.shown })}
    </Button>
  )
}
