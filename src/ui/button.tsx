import { useId } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { Anchor, OctagonX, Pause, Siren } from 'lucide-react'
import type { LucideIcon } from 'lucide-react'
import { classNames } from './class-names.ts'
import { Icon } from './icon.tsx'

export type ButtonKind = 'edge' | 'primary' | 'plain' | 'clear' | 'stop' | 'hold' | 'urgent'
export type ButtonSize = 'usual' | 'small' | 'touch'

/** Kinds that always carry the same drawing, so that they are known without colour. */
const ownIcon: Partial<Record<ButtonKind, LucideIcon>> = {
  clear: Anchor,
  stop: OctagonX,
  hold: Pause,
  urgent: Siren,
}

export interface ButtonLook {
  kind?: ButtonKind
  size?: ButtonSize
  /** Another drawing than the kind's own; `null` for none. */
  icon?: LucideIcon | null
  /** As wide as its place. */
  block?: boolean
}

/** The classes of a button, shared by buttons and by links that look like one. */
export function buttonClass(
  { kind = 'edge', size = 'usual', block = false }: ButtonLook,
  more?: string,
): string {
  return classNames(
    'btn',
    kind !== 'edge' && kind !== 'hold' && `btn-${kind}`,
    size !== 'usual' && `btn-${size}`,
    block && 'btn-block',
    more,
  )
}

/** What stands inside a button or a button-like link. */
export function ButtonFace({
  kind = 'edge',
  size = 'usual',
  icon,
  children,
}: ButtonLook & { children: ReactNode }) {
  const drawing = icon === undefined ? ownIcon[kind] : icon
  return (
    <>
      {drawing ? <Icon of={drawing} size={size === 'touch' ? 20 : 16} /> : null}
      {children}
    </>
  )
}

/**
 * A button. With `shut`, it stays in the tab order and says what would open it, but does nothing:
 * a person must be able to reach the reason. Stop, hold and urgent are never shut by a permission.
 *
 * @param shut words that say what opens it, for example "Choose the use first"
 */
export function Button({
  kind,
  size,
  icon,
  block,
  shut,
  className,
  type = 'button',
  children,
  onClick,
  ...rest
}: ButtonLook & ComponentProps<'button'> & { shut?: string | false }) {
  const hintId = useId()
  const button = (
    <button
      {...rest}
      type={shut ? 'button' : type}
      className={buttonClass({ kind, size, block }, className)}
      onClick={shut ? (event) => event.preventDefault() : onClick}
      {...(shut ? { 'aria-disabled': true, 'aria-describedby': hintId } : {})}
    >
      <ButtonFace kind={kind} size={size} icon={icon}>
        {children}
      </ButtonFace>
    </button>
  )
  if (!shut) return button
  return (
    <span className={classNames('btn-with-hint', block && 'btn-block')}>
      {button}
      <span id={hintId} className="hint">
        {shut}
      </span>
    </span>
  )
}
