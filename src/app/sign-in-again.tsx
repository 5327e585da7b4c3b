import { useRef, useState } from 'react'
import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useNavigate } from 'react-router-dom'
import { signInAddresses } from '../../shared/contracts/sign-in.addresses.ts'
import type { signIn } from '../../shared/contracts/sign-in.contract.ts'
import { signInAgainWords as words } from '../../shared/messages/sign-in-again.ts'
import { signInWords } from '../../shared/messages/sign-in.ts'
import { api } from '../lib/api-client.ts'
import { changePerson, comeBack, useMe } from '../lib/me.ts'
import { usePagePerson } from '../lib/page-person.ts'
import { paths } from '../lib/paths.ts'
import { isProblem } from '../lib/problem-error.ts'
import { Button } from '../ui/button.tsx'
import { Dialog } from '../ui/dialog.tsx'
import { PasswordField } from '../ui/password-field.tsx'

/** Over a page whose session has ended: its person types the password in place, and the page goes on as it was. */
export function SignInAgain() {
  const { ended } = usePagePerson()
  return ended ? <AskAgain /> : null
}

function AskAgain() {
  const me = useMe()
  const client = useQueryClient()
  const navigate = useNavigate()
  const [wrong, setWrong] = useState<string | undefined>()
  const password = useRef<HTMLInputElement>(null)
  const enter = useMutation({
    mutationFn: (typed: string) =>
      api<typeof signIn>(signInAddresses.signIn, { body: { email: me.email, password: typed } }),
    onSuccess: async (back) => {
      comeBack(client, back)
      if (back.mustChangePassword) await navigate(paths.newPassword())
    },
    onError: (error) => {
      if (!isProblem(error)) throw error
      setWrong(error.says)
      if (password.current && !error.noAnswer) password.current.value = ''
      password.current?.focus()
    },
  })
  const form = 'sign-in-again'
  return (
    <Dialog
      alert
      covers
      question={words.question({ name: me.printedName })}
      onBack={() => password.current?.focus()}
      acts={
        <>
          <Button kind="primary" type="submit" form={form} disabled={enter.isPending}>
            {enter.isPending ? signInWords.signingIn : words.goOn}
          </Button>
          <Button onClick={() => changePerson(client, null)}>{words.somebodyElse}</Button>
        </>
      }
    >
      <form
        id={form}
        noValidate
        onSubmit={(event) => {
          event.preventDefault()
          const typed = password.current?.value ?? ''
          setWrong(typed === '' ? signInWords.typePassword : undefined)
          if (typed === '') password.current?.focus()
          else enter.mutate(typed)
        }}
      >
        <p>{words.body}</p>
        {/* so that password keepers know whose password this is */}
        <input type="email" autoComplete="username" value={me.email} readOnly hidden />
        <PasswordField
          ref={password}
          label={signInWords.password}
          autoComplete="current-password"
          wrong={wrong}
          data-first-focus
        />
        <p className="t-note">{words.lost}</p>
      </form>
    </Dialog>
  )
}
