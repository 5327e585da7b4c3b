import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { enclosureFormWords } from '../../../shared/messages/enclosures.ts'
import {
  descriptionOf,
  emptyFields,
  EnclosureForm,
  useEnterEnclosure,
} from '../../features/enclosures/index.ts'
import type { EnclosureFields } from '../../features/enclosures/index.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useToast } from '../../ui/toast-context.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** A new enclosure. Its id is made once, so that sending twice enters one. */
export function Component() {
  useSheetTitle(enclosureFormWords.newTitle)
  const [id] = useState(newId)
  const enter = useEnterEnclosure()
  const navigate = useNavigate()
  const say = useToast()
  const send = async (fields: EnclosureFields) => {
    const entered = await enter.mutateAsync({ id, code: fields.code, ...descriptionOf(fields) })
    say({ words: enclosureFormWords.entered({ code: entered.code }) })
    void navigate(paths.enclosure(entered.code))
  }
  return (
    <EnclosureForm
      title={enclosureFormWords.newTitle}
      start={emptyFields}
      codeIsFixed={false}
      act={enclosureFormWords.enter}
      backTo={paths.water()}
      onSend={send}
    />
  )
}
