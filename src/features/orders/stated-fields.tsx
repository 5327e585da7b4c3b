import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { SelectField } from '../../ui/select-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import type { FieldsProps } from './order-fields.tsx'

type Stated = FieldsProps['values']['stated']
const yesOrNo = ['oxygenIsLogged', 'hasBloom', 'hasPlantsOrAlgae'] as const
/** Asked for one drug alone. */
const ofAgent: Partial<Record<AgentCode, readonly ('isBuffered' | 'hasBiofilter' | 'isAired')[]>> = {
  tricaine: ['isBuffered'],
  formalin: ['isAired'],
  'methylene-blue': ['hasBiofilter'],
}

/** Facts that no ledger holds, stated by whoever writes; open until somebody says so. */
export function StatedFields({
  values,
  onChange,
  water,
  agent,
}: Omit<FieldsProps, 'wrong'> & {
  water: OrderPreview['water'] | undefined
  agent: AgentCode | undefined
}) {
  const { stated } = values
  const set = (changes: Partial<Stated>) => onChange({ stated: { ...stated, ...changes } })
  const taxa = [...new Set((water?.animals ?? []).map((animal) => animal.scientificName))]
  return (
    <details className="fold">
      <summary>{words.stated}</summary>
      <div className="stack">
        <p className="hint">{words.statedHint}</p>
        <Open
          label={words.waterKind}
          value={stated.waterKind}
          options={{ fresh: words.fresh, brackish: words.brackish, marine: words.marine }}
          onChange={(waterKind) => set({ waterKind })}
        />
        {[...yesOrNo, ...((agent && ofAgent[agent]) ?? [])].map((name) => (
          <Open
            key={name}
            label={words[name]}
            value={typeof stated[name] === 'boolean' ? (stated[name] ? 'yes' : 'no') : null}
            options={{ yes: words.yes, no: words.no }}
            onChange={(answer) => set({ [name]: answer === null ? null : answer === 'yes' })}
          />
        ))}
        <Open
          label={words.lights}
          value={stated.lights}
          options={{ full: words.full, dimmed: words.dimmed, off: words.off }}
          onChange={(lights) => set({ lights })}
        />
        {taxa.length > 0 ? (
          <fieldset className="field">
            <legend className="field-label">{words.experience}</legend>
            {taxa.map((taxon) => (
              <Tick
                key={taxon}
                label={<i>{taxon}</i>}
                checked={stated.experienceWith.includes(taxon)}
                onChange={(event) =>
                  set({
                    experienceWith: event.target.checked
                      ? [...stated.experienceWith, taxon]
                      : stated.experienceWith.filter((one) => one !== taxon),
                  })
                }
              />
            ))}
            <span className="hint">{words.experienceHint}</span>
          </fieldset>
        ) : null}
      </div>
    </details>
  )
}

/** A choice that may stay open: not said is an answer of its own. */
function Open<V extends string>({
  label,
  value,
  options,
  onChange,
}: {
  label: string
  value: V | null
  options: Record<V, string>
  onChange: (next: V | null) => void
}) {
  return (
    <SelectField
      label={label}
      startsEmpty={false}
      options={[
        { value: '', label: words.notSaid },
        ...(Object.entries(options) as [V, string][]).map(([key, said]) => ({ value: key, label: said })),
      ]}
      value={value ?? ''}
      onChange={(event) => onChange((event.target.value || null) as V | null)}
    />
  )
}
