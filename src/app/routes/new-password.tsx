import { useState } from 'react'
import { zodResolver } from '@hookform/resolvers/zod'
import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useForm } from 'react-hook-form'
import { useNavigate } from 'react-router-dom'
import { z } from 'zod'
import { changePassword, NewPassword } from '../../../shared/contracts/sign-in.contract.ts'
import { signInWords } from '../../../shared/messages/sign-in.ts'
import { api } from '../../lib/api-client.ts'
import { applyProblem } from '../../lib/apply-problem.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { meKey } from '../../lib/query-client.ts'
import { Button } from '../../ui/button.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { WithMe } from '../with-me.tsx'
import { SignOutButton } from '../shell/sign-out-button.tsx'
import { useSheetTitle } from '../shell/use-sheet-title.ts'
import { SignInFrame } from './sign-in/sign-in-frame.tsx'

// The contract's own rule for the password; that it was typed twice alike is the form's.
const Form = z
  .object({
    currentPassword: z.string().min(1, signInWords.typePassword),
    newPassword: NewPassword,
    again: z.string(),
  })
  .refine((typed) => typed.newPassword === typed.again, { path: ['again'], error: () => signInWords.notSame })
  .refine((typed) => typed.newPassword !== typed.currentPassword, {
    path: ['newPassword'],
    error: () => signInWords.sameAsOld,
  })

/** The first thing after signing in with a one-time password. */
export function Component() {
  return (
    <WithMe>
      <NewPasswordForm />
    </WithMe>
  )
}

function NewPasswordForm() {
  useSheetTitle(signInWords.newTitle)
  const me = useMe()
  const client = useQueryClient()
  const navigate = useNavigate()
  const toast = useToast()
  const [refused, setRefused] = useState<string | undefined>()
  const form = useForm({
    resolver: zodResolver(Form),
    defaultValues: { currentPassword: '', newPassword: '', again: '' },
  })
  const { errors } = form.formState
  const change = useMutation({
    mutationFn: (body: { currentPassword: string; newPassword: string }) => api(changePassword, { body }),
    onSuccess: async (changed) => {
      client.setQueryData(meKey, changed)
      toast({ words: signInWords.changed })
      await navigate(paths.today(), { replace: true })
    },
    onError: (error) => {
      if (!isProblem(error)) throw error
      setRefused(applyProblem(form, error))
      if (isProblem(error, 'password-wrong')) form.setFocus('currentPassword')
    },
  })

  return (
    <SignInFrame>
      <form
        className="sign-in"
        noValidate
        onSubmit={form.handleSubmit(({ currentPassword, newPassword }) => {
          setRefused(undefined)
          change.mutate({ currentPassword, newPassword })
        })}
      >
        <h1 className="t-title is-long">{signInWords.newTitle}</h1>
        <p className="cartouche-source">{signInWords.newSource({ name: me.printedName })}</p>
        <div className="graduated" />
        <WrongSummary fields={[]} general={refused} />
        {/* so that password keepers know whose password this is */}
        <input type="email" autoComplete="username" value={me.email} readOnly hidden />
        <PasswordField
          label={signInWords.currentPassword}
          autoComplete="current-password"
          wrong={errors.currentPassword?.message}
          {...form.register('currentPassword')}
        />
        <PasswordField
          label={signInWords.newPassword}
          hint={signInWords.newHint}
          autoComplete="new-password"
          wrong={errors.newPassword?.message}
          {...form.register('newPassword')}
        />
        <PasswordField
          label={signInWords.again}
          autoComplete="new-password"
          wrong={errors.again?.message}
          {...form.register('again')}
        />
        <Button kind="primary" type="submit" block disabled={change.isPending}>
          {signInWords.keepIt}
        </Button>
        <SignOutButton kind="plain">{signInWords.signOutInstead}</SignOutButton>
      </form>
    </SignInFrame>
  )
}
