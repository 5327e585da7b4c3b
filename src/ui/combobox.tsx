import { useEffect, useId, useRef, useState } from 'react'
import type { KeyboardEvent, Ref } from 'react'
import { ChevronDown } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { classNames } from './class-names.ts'
import { markedParts, matchingOptions, rowAfterKey } from './combobox-model.ts'
import type { ComboboxOption } from './combobox-model.ts'
import { Field } from './field.tsx'
import type { FieldProps } from './field.tsx'
import { Icon } from './icon.tsx'

export type ComboboxProps = FieldProps & {
  options: readonly ComboboxOption[]
  /** Value of the chosen option; `null` when none is. */
  value: string | null
  onChange: (next: string | null) => void
  /** Lists over 200 are searched on the server: called with the text from 2 letters on, options then come from outside. */
  onSearch?: (typed: string) => void
  /** The server is still searching. */
  searching?: boolean
  /** Name of the chosen option, for when it is not among the options now. */
  valueName?: string
  id?: string
  name?: string
  disabled?: boolean
  ref?: Ref<HTMLInputElement>
  onBlur?: () => void
}

/**
 * A field with a list under it. Typing filters; the arrows move; Enter chooses; Esc closes the list and puts back what
 * was chosen. Leaving the field never chooses by itself.
 */
export function Combobox(props: ComboboxProps) {
  const {
    options,
    value,
    onChange,
    onSearch,
    searching,
    valueName,
    label,
    hint,
    wrong,
    optional,
    labelHidden,
  } = props
  const listId = useId()
  const [open, setOpen] = useState(false)
  const [typed, setTyped] = useState<string | null>(null)
  const [active, setActive] = useState<number | null>(null)
  const list = useRef<HTMLUListElement>(null)

  const chosen = options.find((option) => option.value === value)
  const chosenName = value === null ? '' : (chosen?.name ?? valueName ?? '')
  const text = typed ?? chosenName
  const tooShort = onSearch !== undefined && (typed ?? '').trim().length < 2
  const found = onSearch ? (tooShort ? [] : options) : matchingOptions(options, typed ?? '')
  const activeId = active !== null && found[active] ? `${listId}-${active}` : undefined

  useEffect(() => {
    if (active !== null) list.current?.children[active]?.scrollIntoView?.({ block: 'nearest' })
  }, [active])

  const show = (row: number | null) => {
    setOpen(true)
    setActive(row)
  }
  const close = () => {
    setOpen(false)
    setActive(null)
    setTyped(null)
  }
  const choose = (option: ComboboxOption) => {
    onChange(option.value)
    close()
  }

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    const row = rowAfterKey(event.key, open ? active : null, found.length)
    if (row !== null) {
      event.preventDefault()
      const at = found.findIndex((option) => option.value === value)
      return show(open || at < 0 ? row : at)
    }
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') return show(null)
    if (!open) return
    if (event.key === 'Enter') {
      event.preventDefault()
      const option = active === null ? undefined : found[active]
      if (option) choose(option)
    } else if (event.key === 'Escape') {
      // only the list is left, not the dialog around it
      event.preventDefault()
      event.stopPropagation()
      close()
    }
  }

  return (
    <Field {...{ label, hint, wrong, optional, labelHidden, id: props.id }}>
      {(ids) => (
        <div className="combobox-anchor">
          <div className={classNames('control', wrong && 'is-wrong')}>
            <input
              {...ids}
              ref={props.ref}
              name={props.name}
              type="text"
              role="combobox"
              autoComplete="off"
              aria-autocomplete="list"
              aria-expanded={open}
              aria-controls={listId}
              aria-activedescendant={activeId}
              disabled={props.disabled}
              value={text}
              onChange={(event) => {
                const next = event.target.value
                setTyped(next)
                show(null)
                // emptied text means nothing is chosen any more
                if (next.trim() === '' && value !== null) onChange(null)
                if (onSearch && next.trim().length >= 2) onSearch(next.trim())
              }}
              onClick={() => show(null)}
              onKeyDown={onKeyDown}
              onBlur={() => {
                close()
                props.onBlur?.()
              }}
            />
            <button
              type="button"
              className="control-cue"
              tabIndex={-1}
              aria-label={partWords.showList}
              disabled={props.disabled}
              onMouseDown={(event) => {
                event.preventDefault()
                if (open) close()
                else {
                  event.currentTarget.parentElement?.querySelector('input')?.focus()
                  show(null)
                }
              }}
            >
              <Icon of={ChevronDown} />
            </button>
          </div>
          <ul
            ref={list}
            id={listId}
            role="listbox"
            aria-label={label}
            className="combobox-list"
            hidden={!open}
          >
            {open
              ? found.map((option, i) => (
                  <OptionRow
                    key={option.value}
                    id={`${listId}-${i}`}
                    option={option}
                    typed={typed ?? ''}
                    active={i === active}
                    chosen={option.value === value}
                    onChoose={() => choose(option)}
                  />
                ))
              : null}
            {open && found.length === 0 ? (
              <li role="option" aria-disabled="true" aria-selected="false" className="combobox-none">
                {searching
                  ? partWords.fetching
                  : tooShort
                    ? partWords.typeMore
                    : partWords.nothingMatches({ typed: typed ?? '' })}
              </li>
            ) : null}
          </ul>
          <span className="visually-hidden" role="status">
            {open && !searching ? partWords.optionsFound({ count: found.length }) : ''}
          </span>
        </div>
      )}
    </Field>
  )
}

function OptionRow({
  id,
  option,
  typed,
  active,
  chosen,
  onChoose,
}: {
  id: string
  option: ComboboxOption
  typed: string
  active: boolean
  chosen: boolean
  onChoose: () => void
}) {
  return (
    <li
      id={id}
      role="option"
      aria-selected={chosen}
      className={active ? 'is-active' : undefined}
      // before the field loses the focus, and with it the list
      onMouseDown={(event) => {
        event.preventDefault()
        onChoose()
      }}
    >
      <b>
        {markedParts(option.name, typed).map((part, i) =>
          part.marked ? <u key={i}>{part.text}</u> : part.text,
        )}
      </b>
      {option.detail ? <span className="t-2">{option.detail}</span> : null}
      {option.aside ? <span className="aside num">{option.aside}</span> : null}
    </li>
  )
}
