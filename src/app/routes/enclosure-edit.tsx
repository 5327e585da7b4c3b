import { useNavigate, useParams } from 'react-router-dom'
import type { Enclosure } from '../../../shared/contracts/enclosures.contract.ts'
import { enclosureFormWords } from '../../../shared/messages/enclosures.ts'
import {
  descriptionOf,
  EnclosureForm,
  fieldsOf,
  useCorrectEnclosure,
} from '../../features/enclosures/index.ts'
import type { EnclosureFields } from '../../features/enclosures/index.ts'
import { WithEnclosureWater } from '../../features/water/index.ts'
import { paths } from '../../lib/paths.ts'
import { useToast } from '../../ui/toast-context.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Correcting the description of an enclosure. What was typed is kept when somebody else saved first. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(enclosureFormWords.correctTitle({ code }))
  return (
    <WithEnclosureWater code={code}>
      {(water) => <Correction key={code} enclosure={water.enclosure} />}
    </WithEnclosureWater>
  )
}

function Correction({ enclosure }: { enclosure: Enclosure }) {
  const { code, version } = enclosure
  const correct = useCorrectEnclosure(code)
  const navigate = useNavigate()
  const say = useToast()
  const send = async (fields: EnclosureFields) => {
    await correct.mutateAsync({ expectedVersion: version, ...descriptionOf(fields) })
    say({ words: enclosureFormWords.corrected({ code }) })
    void navigate(paths.enclosure(code))
  }
  return (
    <EnclosureForm
      title={enclosureFormWords.correctTitle({ code })}
      start={fieldsOf(enclosure)}
      codeIsFixed
      act={enclosureFormWords.save}
      backTo={paths.enclosure(code)}
      onSend={send}
    />
  )
}
