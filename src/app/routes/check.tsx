import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Search } from 'lucide-react'
import { useNavigate, useParams } from 'react-router-dom'
import { checkWords as words } from '../../../shared/messages/documents-sheet.ts'
import { checkQuery, CheckView } from '../../features/documents/index.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ListFetching } from '../../ui/list-states.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Is this paper current? Looks up the record check at the foot of a print. */
export function Component() {
  useSheetTitle(words.title)
  const { fingerprint = '' } = useParams()
  const navigate = useNavigate()
  const [typed, setTyped] = useState(fingerprint)
  const query = useQuery({ ...checkQuery(fingerprint), enabled: fingerprint !== '' })
  const refused = isProblem(query.error) ? query.error : null
  const field = refused?.errors[0]?.detail
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={words.place} title={words.title} source={words.source} />
        <form
          className="pane stack gap-4"
          onSubmit={(event) => {
            event.preventDefault()
            if (typed.trim() !== '') void navigate(paths.check(typed.trim()))
          }}
        >
          <TextField
            label={words.label}
            hint={words.hint}
            wrong={field}
            autoComplete="off"
            autoCapitalize="characters"
            spellCheck={false}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
          <div>
            <Button kind="primary" type="submit" icon={Search}>
              {words.look}
            </Button>
          </div>
        </form>
      </Area>
      <Area className="pane">
        {refused && field === undefined ? (
          <div role="alert" className="stack">
            <h2 className="t-head">{refused.title}</h2>
            <p>{refused.detail}</p>
          </div>
        ) : null}
        {query.isFetching && !query.data ? <ListFetching what={words.prints} /> : null}
        {query.data && !refused ? <CheckView found={query.data} /> : null}
      </Area>
    </Sheet>
  )
}
