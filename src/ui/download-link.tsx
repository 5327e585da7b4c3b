import { Download } from 'lucide-react'
import type { ReactNode } from 'react'
import { buttonClass, ButtonFace } from './button.tsx'

/** A link that looks like a button and brings a file. */
export function DownloadLink({ href, children }: { href: string; children: ReactNode }) {
  return (
    <a href={href} download className={buttonClass({})}>
      <ButtonFace icon={Download}>{children}</ButtonFace>
    </a>
  )
}
