import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { Undo2 } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Icon } from './icon.tsx'

/**
 * A sheet for the hand: top bar with back, name and flag; the work; and at the foot the one act, within reach of the
 * thumb. No hour ruler.
 */
export function PhoneSheet({
  back,
  title,
  under,
  flag,
  banner,
  foot,
  children,
}: {
  back: { to: string; label?: string }
  title: string
  under?: ReactNode
  flag?: ReactNode
  banner?: ReactNode
  foot?: ReactNode
  children: ReactNode
}) {
  return (
    <div className="phone-sheet">
      <header className="phone-top">
        <Link className="phone-back" to={back.to} aria-label={back.label ?? partWords.back}>
          <Icon of={Undo2} size={26} />
        </Link>
        <div className="min-w-0">
          <h1>{title}</h1>
          {under ? <p>{under}</p> : null}
        </div>
        {flag ?? <span />}
      </header>
      {banner ?? <div />}
      <main id="chart" tabIndex={-1} className="phone-main">
        {children}
      </main>
      {foot ? <footer className="phone-foot">{foot}</footer> : null}
    </div>
  )
}
