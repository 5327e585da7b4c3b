import { useRef, useState } from 'react'
import type { FormEvent } from 'react'
import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useLocation, useNavigate } from 'react-router-dom'
import { signInAddresses } from '../../../shared/contracts/sign-in.addresses.ts'
import type { signIn } from '../../../shared/contracts/sign-in.contract.ts'
import { frameWords } from '../../../shared/messages/frame.ts'
import { signInWords } from '../../../shared/messages/sign-in.ts'
import { api } from '../../lib/api-client.ts'
import { changePerson } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { themeFor } from '../../lib/theme.ts'
import { Button } from '../../ui/button.tsx'
import { PasswordField } from '../../ui/password-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { wantedAddress } from '../require-sign-in.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'
import { SignInFrame } from './sign-in/sign-in-frame.tsx'

interface Faults {
  general?: string
  email?: string | undefined
  password?: string | undefined
}

/**
 * Sign-in by e-mail and password. The words are the same whether an account exists or not.
 *
 * The only form without the form library and the contract's schema: they are half as much again as everything else that
 * the first screen loads, and the server checks the same contract.
 */
export function Component() {
  useSheetTitle(signInWords.title)
  const client = useQueryClient()
  const navigate = useNavigate()
  const { search } = useLocation()
  const [faults, setFaults] = useState<Faults>({})
  const email = useRef<HTMLInputElement>(null)
  const password = useRef<HTMLInputElement>(null)
  const enter = useMutation({
    mutationFn: (body: { email: string; password: string }) =>
      api<typeof signIn>(signInAddresses.signIn, { body }),
    onSuccess: async (me) => {
      changePerson(client, me)
      themeFor(me.id, me.preferences.theme)
      await navigate(me.mustChangePassword ? paths.newPassword() : wantedAddress(search), {
        replace: true,
      })
    },
    onError: (error) => {
      if (!isProblem(error)) throw error
      const at = (pointer: string) => error.errors.some((field) => field.pointer === pointer)
      if (at('/email') || at('/password')) return point({ email: at('/email'), password: at('/password') })
      setFaults({ general: error.says })
      if (password.current && !error.noAnswer) password.current.value = ''
      password.current?.focus()
    },
  })

  const point = (wrong: { email: boolean; password: boolean }) => {
    setFaults({
      email: wrong.email ? signInWords.typeEmail : undefined,
      password: wrong.password ? signInWords.typePassword : undefined,
    })
    const first = wrong.email ? email : password
    first.current?.focus()
  }

  const submit = (event: FormEvent) => {
    event.preventDefault()
    const body = { email: email.current?.value.trim() ?? '', password: password.current?.value ?? '' }
    const wrong = { email: !/^\S+@\S+$/.test(body.email), password: body.password === '' }
    if (wrong.email || wrong.password) return point(wrong)
    setFaults({})
    enter.mutate(body)
  }

  return (
    <SignInFrame>
      <form className="sign-in" noValidate onSubmit={submit}>
        <h1 className="t-title">{frameWords.name}</h1>
        <p className="cartouche-source">{signInWords.source}</p>
        <div className="graduated" />
        <WrongSummary fields={[]} general={faults.general} />
        <TextField
          ref={email}
          label={signInWords.email}
          name="email"
          type="email"
          autoComplete="username"
          autoCapitalize="none"
          spellCheck={false}
          wrong={faults.email}
        />
        <PasswordField
          ref={password}
          label={signInWords.password}
          name="password"
          autoComplete="current-password"
          wrong={faults.password}
        />
        <Button kind="primary" type="submit" block disabled={enter.isPending}>
          {enter.isPending ? signInWords.signingIn : signInWords.signIn}
        </Button>
        <p className="t-note">
          {signInWords.forgotten}
          <br />
          {signInWords.lockout}
        </p>
      </form>
    </SignInFrame>
  )
}
