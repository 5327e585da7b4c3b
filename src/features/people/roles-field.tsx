import { roles } from '../../../shared/domain/permissions/roles.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { peopleWords, roleTitles } from '../../../shared/messages/people.ts'
import { FieldBelow } from '../../ui/field.tsx'
import { Tick } from '../../ui/tick.tsx'

/** The roles a person holds; none is ticked beforehand. */
export function RolesField({
  value,
  wrong,
  onChange,
}: {
  value: readonly Role[]
  wrong: string | undefined
  onChange: (next: Role[]) => void
}) {
  return (
    <fieldset className="field" aria-describedby="roles-below">
      <legend className="field-label">{peopleWords.roles}</legend>
      {roles.map((role) => (
        <Tick
          key={role}
          label={roleTitles[role]}
          checked={value.includes(role)}
          onChange={(event) =>
            onChange(event.target.checked ? [...value, role] : value.filter((one) => one !== role))
          }
        />
      ))}
      <FieldBelow id="roles-below" hint={peopleWords.rolesHint} wrong={wrong} />
    </fieldset>
  )
}
