import { ChevronDown } from 'lucide-react'
import { Link, useLocation } from 'react-router-dom'
import { frameWords } from '../../../shared/messages/frame.ts'
import { Icon } from '../../ui/icon.tsx'
import { Mark } from '../../ui/mark.tsx'
import { Menu } from '../../ui/menu.tsx'
import { sheetAt, sheets } from '../sheets.ts'

/** The eight sheets in the bridge of a wide screen, with their numbers. */
export function SheetLinks() {
  const current = sheetAt(useLocation().pathname)
  return (
    <nav className="sheets" aria-label={frameWords.sheets}>
      {sheets().map((sheet) => (
        <Link key={sheet.name} to={sheet.to} aria-current={sheet.name === current ? 'page' : undefined}>
          <kbd>{sheet.number}</kbd>
          {sheet.words}
        </Link>
      ))}
    </nav>
  )
}

/** At 900 px and below the eight are one button with the current one on it; on a phone the list is behind the mark. */
export function SheetMenu({ behindMark }: { behindMark: boolean }) {
  const current = sheetAt(useLocation().pathname)
  const all = sheets()
  const now = all.find((sheet) => sheet.name === current)
  const words = now?.words ?? frameWords.settings
  return (
    <Menu
      side="left"
      className="sheet-list"
      label={frameWords.sheetMenu({ current: words })}
      buttonClass={behindMark ? 'brand' : 'sheet-button'}
      face={
        behindMark ? (
          <>
            <Mark />
            <b>{words}</b>
            <Icon of={ChevronDown} />
          </>
        ) : (
          <>
            {now ? <kbd>{now.number}</kbd> : null}
            {words}
            <Icon of={ChevronDown} />
          </>
        )
      }
    >
      {(close) => (
        <>
          {all.map((sheet) => (
            <Link
              key={sheet.name}
              role="menuitem"
              tabIndex={-1}
              className="menu-item"
              to={sheet.to}
              aria-current={sheet.name === current ? 'page' : undefined}
              onClick={close}
            >
              <kbd>{sheet.number}</kbd>
              {sheet.words}
            </Link>
          ))}
        </>
      )}
    </Menu>
  )
}
