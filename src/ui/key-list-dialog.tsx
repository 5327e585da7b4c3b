import type { ReactNode } from 'react'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'

/** The list of keys, opened by `?` and from the person's menu. */
export function KeyListDialog({ onBack }: { onBack: () => void }) {
  const command = isMac() ? partWords.keyCommand : partWords.keyCtrl
  return (
    <Dialog
      question={partWords.keys}
      onBack={onBack}
      acts={<Button onClick={onBack}>{partWords.close}</Button>}
    >
      <dl className="key-list">
        <Line keys={<Key>g</Key>} says={partWords.keysGo} />
        <Line
          keys={
            <>
              <Key>{command}</Key> <Key>K</Key> {partWords.or} <Key>/</Key>
            </>
          }
          says={partWords.keysFind}
        />
        <Line keys={<Key>L</Key>} says={partWords.keysLog} />
        <Line keys={<Key>N</Key>} says={partWords.keysEntry} />
        <Line keys={<Key>{partWords.keyArrows}</Key>} says={partWords.keysArrows} />
        <Line keys={<Key>{partWords.keyEnter}</Key>} says={partWords.keysChoose} />
        <Line keys={<Key>{partWords.keyEsc}</Key>} says={partWords.keysEsc} />
        <Line
          keys={
            <>
              <Key>{command}</Key> <Key>{partWords.keyEnterOnly}</Key>
            </>
          }
          says={partWords.keysSave}
        />
        <Line keys={<Key>?</Key>} says={partWords.keysList} />
      </dl>
      <p className="hint">{partWords.keysOff}</p>
    </Dialog>
  )
}

/** Whether the keyboard has a command key. */
export function isMac(): boolean {
  return /Mac|iPhone|iPad/.test(navigator.userAgent)
}

function Key({ children }: { children: ReactNode }) {
  return <kbd className="key">{children}</kbd>
}

function Line({ keys, says }: { keys: ReactNode; says: string }) {
  return (
    <>
      <dt>{keys}</dt>
      <dd>{says}</dd>
    </>
  )
}
