import type { LucideIcon } from 'lucide-react'

const sizes = { 16: 'icon', 20: 'icon icon-l', 26: 'icon icon-xl' } as const

/**
 * One Lucide drawing in a size of the design system. It says nothing to readers: the words stand beside it,
 * or in the label of the control that holds only a picture.
 */
export function Icon({ of: Drawing, size = 16 }: { of: LucideIcon; size?: keyof typeof sizes }) {
  return <Drawing className={sizes[size]} strokeWidth={1.6} aria-hidden="true" />
}
