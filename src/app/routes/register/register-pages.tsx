import { NavLink } from 'react-router-dom'
import { registerWords as words } from '../../../../shared/messages/register-sheet.ts'
import { paths } from '../../../lib/paths.ts'

/** The pages of the register, the same on each of them. */
export function RegisterPages() {
  const pages = [
    { to: paths.register(), label: words.transactions },
    { to: paths.permits(), label: words.permits },
    { to: paths.exports(), label: words.exports },
    { to: paths.parties(), label: words.parties },
  ]
  return (
    <nav aria-label={words.pages} className="side-pages">
      {pages.map((page) => (
        <NavLink key={page.to} to={page.to} end>
          {page.label}
        </NavLink>
      ))}
    </nav>
  )
}
