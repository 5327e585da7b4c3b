import { useRef, useState } from 'react'
import { formWords } from '../../../shared/messages/form.ts'
import { handoverWords } from '../../../shared/messages/today.ts'
import { newId } from '../../lib/new-id.ts'
import { useRefusal } from '../../lib/use-refusal.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { useWriteHandover } from './mutations.ts'

/** The entry box at the foot of the log: a note for the next watch. What was typed stays until it has gone through. */
export function WriteHandover() {
  const write = useWriteHandover()
  const toast = useToast()
  const refusal = useRefusal()
  const id = useRef(newId())
  const [words, setWords] = useState('')
  const [about, setAbout] = useState('')
  const [asked, setAsked] = useState(false)
  const empty = words.trim() === ''
  const send = async () => {
    setAsked(true)
    if (empty) return
    const sent = await refusal.attempt(() =>
      write.mutateAsync({ id: id.current, about: about.trim(), words: words.trim() }),
    )
    if (!sent) return
    id.current = newId()
    setWords('')
    setAbout('')
    setAsked(false)
    toast({ words: handoverWords.written })
  }
  const general = refusal.general(['/words', '/about'])
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        void send()
      }}
    >
      <TextareaField
        label={handoverWords.label}
        rows={2}
        value={words}
        wrong={asked && empty ? formWords.needed : refusal.at('/words')}
        onChange={(event) => setWords(event.target.value)}
      />
      {words === '' ? null : (
        <TextField
          label={handoverWords.about}
          optional
          value={about}
          wrong={refusal.at('/about')}
          onChange={(event) => setAbout(event.target.value)}
        />
      )}
      {general === undefined ? null : <p role="alert">{general}</p>}
      <Button type="submit" size="small" shut={refusal.busy && formWords.sending}>
        {handoverWords.leave}
      </Button>
    </form>
  )
}
