import { useState } from 'react'
import { Controller, useForm } from 'react-hook-form'
import { enterPerson } from '../../../shared/contracts/people.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { useLeaveGuard } from '../../lib/use-leave-guard.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { Button } from '../../ui/button.tsx'
import { Cartouche } from '../../ui/cartouche.tsx'
import { LeaveQuestion } from '../../ui/leave-question.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useEnterPerson } from './mutations.ts'
import { OneTimePassword } from './one-time-password.tsx'
import { RolesField } from './roles-field.tsx'

type Body = BodyOf<typeof enterPerson>

/** Enters a person; the one-time password is shown once, here. */
export function NewPerson() {
  // Made once for this attempt and kept over retries, so that a repeated request enters nobody twice
  const [id] = useState(newId)
  const [refused, setRefused] = useState<string | undefined>()
  const enter = useEnterPerson()
  const form = useForm<Body>({
    resolver: bodyResolver(enterPerson.body, ({ email, printedName, ...typed }) => ({
      ...typed,
      email: typedText(email),
      printedName: typedText(printedName),
    })),
    defaultValues: { id, email: '', printedName: '', roles: [] },
  })
  const { errors, isDirty } = form.formState
  const submit = form.handleSubmit((typed) => {
    setRefused(undefined)
    enter.mutate(typed, {
      onError: (error) => {
        if (!isProblem(error)) return
        if (error.code === 'email-already-used') form.setError('email', { message: error.title })
        else setRefused(applyProblem(form, error))
      },
    })
  })
  const entered = enter.data
  const { blocker } = useLeaveGuard(isDirty && entered === undefined)

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={peopleWords.title} title={peopleWords.enter} source={peopleWords.rolesHint} />
      </Area>
      <Area className="pane stack max-w-[460px]">
        {entered ? (
          <>
            <OneTimePassword name={entered.printedName} password={entered.oneTimePassword} />
            <div className="row row-wrap">
              <ButtonLink kind="primary" to={paths.person(entered.id)}>
                {entered.printedName}
              </ButtonLink>
              <ButtonLink to={paths.people()}>{peopleWords.back}</ButtonLink>
            </div>
          </>
        ) : (
          <form className="stack" noValidate onSubmit={submit}>
            <WrongSummary fields={[]} general={refused} />
            <TextField
              label={peopleWords.name}
              hint={peopleWords.nameHint}
              wrong={errors.printedName?.message}
              autoComplete="off"
              {...form.register('printedName')}
            />
            <TextField
              label={peopleWords.email}
              hint={peopleWords.emailHint}
              type="email"
              wrong={errors.email?.message}
              autoComplete="off"
              {...form.register('email')}
            />
            <Controller
              control={form.control}
              name="roles"
              render={({ field }) => (
                <RolesField value={field.value} wrong={errors.roles?.message} onChange={field.onChange} />
              )}
            />
            <div className="row row-wrap">
              <Button kind="primary" type="submit" disabled={enter.isPending}>
                {peopleWords.enterThis}
              </Button>
              <ButtonLink to={paths.people()}>{peopleWords.goBack}</ButtonLink>
            </div>
          </form>
        )}
      </Area>
      <LeaveQuestion blocker={blocker} />
    </Sheet>
  )
}
