import { useState } from 'react'
import type { ReactNode } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { Dialog } from './dialog.tsx'
import { TextField } from './text-field.tsx'

/**
 * The frame of finding: one field, and under it what was found. What is found comes from outside, as links.
 *
 * @param children called with the text once it has 2 letters
 */
export function FindDialog({
  onBack,
  children,
}: {
  onBack: () => void
  children: (typed: string) => ReactNode
}) {
  const [typed, setTyped] = useState('')
  return (
    <Dialog question={partWords.find} onBack={onBack} wide>
      <TextField
        label={partWords.findLabel}
        hint={partWords.findHint}
        type="search"
        autoComplete="off"
        data-first-focus
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
      />
      {typed.trim().length >= 2 ? <div className="find-results">{children(typed.trim())}</div> : null}
    </Dialog>
  )
}
