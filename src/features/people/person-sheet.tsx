import { useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { KeyRound, LockKeyhole } from 'lucide-react'
import { Link } from 'react-router-dom'
import { licenceSummaries, peopleWords, roleTitles } from '../../../shared/messages/people.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { useMe } from '../../lib/me.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { QueryStanding } from '../../lib/query-standing.tsx'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Icon } from '../../ui/icon.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { CorrectPersonForm } from './correct-person-form.tsx'
import { LicenceList } from './licence-list.tsx'
import { useIssueOneTimePassword } from './mutations.ts'
import { OneTimePassword } from './one-time-password.tsx'
import { personQuery } from './queries.ts'

/** One person: name, roles, account, password, licences. */
export function PersonSheet({ id }: { id: string }) {
  const me = useMe()
  const query = useQuery(personQuery(id))
  const [asking, setAsking] = useState<string | null>(null)
  const [loaded, setLoaded] = useState(0)
  const [unsavedPerson, setUnsavedPerson] = useState(false)
  const [unsavedLicence, setUnsavedLicence] = useState(false)
  const { blocker } = useLeaveGuard(unsavedPerson || unsavedLicence)
  const issue = useIssueOneTimePassword(id)
  const person = query.data

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.people()}>{peopleWords.title}</Link>}
          title={person?.printedName ?? peopleWords.people}
          source={
            person
              ? `${person.roles.map((role) => roleTitles[role]).join(', ')} · ${peopleWords.licence}: ${licenceSummaries[person.licenceState]}`
              : undefined
          }
        />
        {person ? (
          <div className="pane stack">
            {person.signingLockedUntil === null ? null : (
              <p className="row items-start" role="status">
                <Icon of={LockKeyhole} />
                <span>
                  {peopleWords.signingLocked({
                    until: sayInstant(person.signingLockedUntil, me.facility.zone),
                  })}
                </span>
              </p>
            )}
            <Button icon={KeyRound} onClick={() => setAsking(newId())}>
              {peopleWords.oneTimeNew}
            </Button>
            {issue.data ? (
              <OneTimePassword name={person.printedName} password={issue.data.oneTimePassword} />
            ) : null}
          </div>
        ) : null}
      </Area>
      <Area className="pane stack gap-6">
        <QueryStanding
          query={query}
          what={peopleWords.list}
          titleOf={({ code }) => (code === 'not-found' ? peopleWords.notHere : undefined)}
        />
        {person ? (
          <>
            <CorrectPersonForm
              key={`${person.id} ${String(loaded)}`}
              person={person}
              onLoadNewer={() => void query.refetch().then(() => setLoaded((n) => n + 1))}
              onUnsaved={setUnsavedPerson}
            />
            <LicenceList person={person} onUnsaved={setUnsavedLicence} />
          </>
        ) : null}
      </Area>
      <LeaveQuestion blocker={blocker} />
      {asking && person ? (
        <Dialog
          question={peopleWords.oneTimeAsk({ name: person.printedName })}
          onBack={() => setAsking(null)}
          acts={
            <>
              <Button
                kind="primary"
                disabled={issue.isPending}
                onClick={() => issue.mutate(asking, { onSuccess: () => setAsking(null) })}
              >
                {peopleWords.oneTimeAct}
              </Button>
              <Button onClick={() => setAsking(null)}>{peopleWords.goBack}</Button>
            </>
          }
        >
          <p>{peopleWords.oneTimeWarn}</p>
          {isProblem(issue.error) ? <p role="alert">{issue.error.says}</p> : null}
        </Dialog>
      ) : null}
    </Sheet>
  )
}
