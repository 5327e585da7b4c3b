import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import { useNavigate, useParams } from 'react-router-dom'
import type { Enclosure } from '../../../shared/contracts/enclosures.contract.ts'
import { enclosureFormWords } from '../../../shared/messages/enclosures.ts'
import {
  descriptionOf,
  EnclosureForm,
  enclosureQuery,
  fieldsOf,
  useCorrectEnclosure,
} from '../../features/enclosures/index.ts'
import type { EnclosureFields } from '../../features/enclosures/index.ts'
import { WithEnclosureWater } from '../../features/water/index.ts'
import { isProblem } from '../../lib/problem-error.ts'
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

/** The fields that read otherwise in what is stored now, in words, for somebody whose own text is kept. */
function differencesOf(mine: EnclosureFields, stored: EnclosureFields): string[] {
  const named = {
    name: enclosureFormWords.name,
    area: enclosureFormWords.area,
    boundary: enclosureFormWords.boundary,
    airSpace: enclosureFormWords.airSpace,
    description: enclosureFormWords.description,
  } as const
  return (Object.keys(named) as (keyof typeof named)[])
    .filter((field) => mine[field].trim() !== stored[field])
    .map((field) =>
      enclosureFormWords.storedNow({
        field: named[field],
        value: stored[field] || enclosureFormWords.nothing,
      }),
    )
}

function Correction({ enclosure }: { enclosure: Enclosure }) {
  const { code } = enclosure
  // The version that this form was opened on: a newer one read meanwhile must not let it pass over somebody's change
  const [version, setVersion] = useState(enclosure.version)
  const [opened] = useState(() => fieldsOf(enclosure))
  const [differences, setDifferences] = useState<string[]>([])
  const correct = useCorrectEnclosure(code)
  const client = useQueryClient()
  const navigate = useNavigate()
  const say = useToast()
  const send = async (fields: EnclosureFields) => {
    try {
      await correct.mutateAsync({ expectedVersion: version, ...descriptionOf(fields) })
    } catch (error) {
      if (isProblem(error, 'stale-version')) {
        const stored = await client.fetchQuery(enclosureQuery(code))
        setVersion(stored.version)
        setDifferences(differencesOf(fields, fieldsOf(stored)))
      }
      throw error
    }
    say({ words: enclosureFormWords.corrected({ code }) })
    void navigate(paths.enclosure(code))
  }
  return (
    <EnclosureForm
      title={enclosureFormWords.correctTitle({ code })}
      start={opened}
      codeIsFixed
      act={enclosureFormWords.save}
      backTo={paths.enclosure(code)}
      storedNow={differences}
      onSend={send}
    />
  )
}
