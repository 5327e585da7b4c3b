import type { ReactNode } from 'react'
import { Button } from '../../ui/button.tsx'
import type { ButtonKind } from '../../ui/button.tsx'
import { useSignOut } from './use-sign-out.ts'

/** Signs out. */
export function SignOutButton({ kind, children }: { kind?: ButtonKind; children: ReactNode }) {
  const signOut = useSignOut()
  return (
    <Button kind={kind ?? 'edge'} disabled={signOut.isPending} onClick={() => signOut.mutate()}>
      {children}
    </Button>
  )
}
