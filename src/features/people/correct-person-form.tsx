import { useState } from 'react'
import { Controller, useForm } from 'react-hook-form'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { correctPerson } from '../../../shared/contracts/people.contract.ts'
import type { Person } from '../../../shared/contracts/people.contract.ts'
import { peopleWords } from '../../../shared/messages/people.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { bodyResolver } from '../../lib/body-resolver.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { typedText } from '../../lib/typed-text.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useCorrectPerson } from './mutations.ts'
import { RolesField } from './roles-field.tsx'
import { useTellUnsaved } from './use-tell-unsaved.ts'

type Body = BodyOf<typeof correctPerson>

const bodyOf = (person: Person): Body => ({
  expectedVersion: person.version,
  email: person.email,
  printedName: person.printedName,
  roles: person.roles,
  active: person.active,
})

/** Name, e-mail, roles and account of a person. A stale save keeps what was typed. */
export function CorrectPersonForm({
  person,
  onLoadNewer,
  onUnsaved,
}: {
  person: Person
  onLoadNewer: () => void
  onUnsaved: (unsaved: boolean) => void
}) {
  const toast = useToast()
  const [refused, setRefused] = useState<string | undefined>()
  const [stale, setStale] = useState(false)
  const correct = useCorrectPerson(person.id)
  const form = useForm<Body>({
    resolver: bodyResolver(correctPerson.body, ({ email, printedName, ...typed }) => ({
      ...typed,
      email: typedText(email),
      printedName: typedText(printedName),
    })),
    defaultValues: bodyOf(person),
  })
  const { errors, isDirty } = form.formState
  useTellUnsaved(isDirty, onUnsaved)
  const submit = form.handleSubmit((typed) => {
    setRefused(undefined)
    setStale(false)
    correct.mutate(typed, {
      onSuccess: (saved) => {
        form.reset(bodyOf(saved))
        toast({ words: peopleWords.kept })
      },
      onError: (error) => {
        if (!isProblem(error)) return
        if (error.code === 'stale-version') setStale(true)
        else if (error.code === 'email-already-used') form.setError('email', { message: error.title })
        else setRefused(applyProblem(form, error))
      },
    })
  })

  return (
    <form className="stack max-w-[460px]" noValidate onSubmit={submit}>
      <WrongSummary fields={[]} general={stale ? peopleWords.theirs : refused} />
      {stale ? (
        <Button size="small" onClick={onLoadNewer}>
          {peopleWords.loadNewer}
        </Button>
      ) : null}
      <TextField
        label={peopleWords.name}
        hint={peopleWords.nameHint}
        wrong={errors.printedName?.message}
        {...form.register('printedName')}
      />
      <TextField
        label={peopleWords.email}
        hint={peopleWords.emailHint}
        type="email"
        wrong={errors.email?.message}
        {...form.register('email')}
      />
      <Controller
        control={form.control}
        name="roles"
        render={({ field }) => (
          <RolesField value={field.value} wrong={errors.roles?.message} onChange={field.onChange} />
        )}
      />
      <Tick label={peopleWords.signsIn} hint={peopleWords.signsInHint} {...form.register('active')} />
      <div>
        <Button kind="primary" type="submit" disabled={correct.isPending}>
          {peopleWords.keep}
        </Button>
      </div>
    </form>
  )
}
