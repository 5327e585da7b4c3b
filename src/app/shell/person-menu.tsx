import { useState } from 'react'
import { ChevronDown, User } from 'lucide-react'
import { Link } from 'react-router-dom'
import { frameRoleNames, frameWords } from '../../../shared/messages/frame.ts'
import { useMay } from '../../lib/may.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { useSetPreference } from '../../lib/preferences.ts'
import { chooseTheme, themeChoices, useThemeChoice } from '../../lib/theme.ts'
import { useOutbox } from '../../lib/use-outbox.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Icon } from '../../ui/icon.tsx'
import { Menu } from '../../ui/menu.tsx'
import { landedPages } from '../landed-pages.ts'
import { useSignOut } from './use-sign-out.ts'

/** Under the person's name: settings, people for who may, light, keys, sign out. */
export function PersonMenu({ onKeyList, short }: { onKeyList: () => void; short: boolean }) {
  const me = useMe()
  const mayPeople = useMay('people.manage')
  const mayFacility = useMay('facility.manage')
  const signOut = useSignOut()
  const { waiting, refused } = useOutbox()
  const unsent = waiting.length + refused.length
  const [asking, setAsking] = useState(false)
  const keep = useSetPreference()
  const theme = useThemeChoice()
  const pages = [
    { to: paths.ownSettings(), words: frameWords.ownSettings, shown: true },
    { to: paths.people(), words: frameWords.people, shown: mayPeople.allowed },
    { to: paths.facility(), words: frameWords.facility, shown: mayFacility.allowed },
    { to: paths.rules(), words: frameWords.rules, shown: true },
    { to: paths.audit(), words: frameWords.audit, shown: true },
    { to: paths.reports(), words: frameWords.reports, shown: true },
  ].filter((page) => page.shown && landedPages.has(page.to))

  return (
    <>
      <Menu
        label={frameWords.person({ name: me.printedName })}
        face={
          short ? (
            <Icon of={User} size={20} />
          ) : (
            <>
              <Icon of={User} />
              {me.printedName}
              <Icon of={ChevronDown} />
            </>
          )
        }
      >
        {(close) => (
          <>
            <div className="menu-group" role="presentation">
              <p className="menu-label t-note">
                <b className="block text-ink text-[14px]">{me.printedName}</b>
                {me.roles.map((role) => frameRoleNames[role]).join(', ')}
              </p>
              {pages.map((page) => (
                <Link
                  key={page.to}
                  role="menuitem"
                  tabIndex={-1}
                  className="menu-item"
                  to={page.to}
                  onClick={close}
                >
                  {page.words}
                </Link>
              ))}
              <button
                type="button"
                role="menuitem"
                tabIndex={-1}
                className="menu-item"
                onClick={() => {
                  close()
                  onKeyList()
                }}
              >
                {frameWords.help}
              </button>
            </div>
            <div className="menu-group" role="group" aria-label={frameWords.watch}>
              {themeChoices.map((choice) => (
                <button
                  key={choice}
                  type="button"
                  role="menuitemradio"
                  tabIndex={-1}
                  aria-checked={choice === theme}
                  className="menu-item"
                  onClick={() => {
                    chooseTheme(choice, me.id)
                    keep.mutate({ name: 'theme', value: choice })
                  }}
                >
                  {frameWords[choice]}
                </button>
              ))}
            </div>
            <div className="menu-group" role="presentation">
              <button
                type="button"
                role="menuitem"
                tabIndex={-1}
                className="menu-item"
                onClick={() => {
                  if (unsent === 0) return signOut.mutate()
                  close()
                  setAsking(true)
                }}
              >
                {frameWords.signOut}
              </button>
            </div>
          </>
        )}
      </Menu>
      {asking ? (
        <Dialog
          question={frameWords.signOutQuestion({ count: unsent })}
          onBack={() => setAsking(false)}
          acts={
            <>
              <Button kind="primary" disabled={signOut.isPending} onClick={() => signOut.mutate()}>
                {frameWords.signOut}
              </Button>
              <Button onClick={() => setAsking(false)}>{frameWords.signOutStay}</Button>
            </>
          }
        >
          <p>{frameWords.signOutBody}</p>
        </Dialog>
      ) : null}
    </>
  )
}
