import type { ReactNode } from 'react'
import { Moon, Sun } from 'lucide-react'
import { frameWords } from '../../../../shared/messages/frame.ts'
import { signInWords } from '../../../../shared/messages/sign-in.ts'
import { chooseTheme, useThemeChoice } from '../../../lib/theme.ts'
import { Icon } from '../../../ui/icon.tsx'
import { Mark } from '../../../ui/mark.tsx'
import { useMedia } from '../../../ui/use-media.ts'
import { HarbourChart } from './harbour-chart.tsx'

/** The frame of sign-in and of the first change of password: the harbour chart with a cartouche on it. */
export function SignInFrame({ children }: { children: ReactNode }) {
  const choice = useThemeChoice()
  const dark = useMedia('(prefers-color-scheme: dark)')
  const night = choice === 'night' || (choice === 'device' && dark)
  return (
    <div className="sign-in-page">
      <header className="bridge">
        <span className="brand">
          <Mark />
          <b>{frameWords.name}</b>
        </span>
        <span />
        <div className="bridge-end">
          <button type="button" className="ghost" onClick={() => chooseTheme(night ? 'day' : 'night')}>
            <Icon of={night ? Sun : Moon} />
            {night ? signInWords.dayWatch : signInWords.nightWatch}
          </button>
        </div>
      </header>
      <main className="grid min-h-0">
        <HarbourChart>{children}</HarbourChart>
      </main>
    </div>
  )
}
