import type { ComponentProps } from 'react'
import { Link } from 'react-router-dom'
import { buttonClass, ButtonFace } from './button.tsx'
import type { ButtonLook } from './button.tsx'

/** A link that looks like a button: for going somewhere, never for doing something. */
export function ButtonLink({
  kind,
  size,
  icon,
  block,
  className,
  children,
  ...rest
}: ButtonLook & ComponentProps<typeof Link>) {
  return (
    <Link {...rest} className={buttonClass({ kind, size, block }, className)}>
      <ButtonFace kind={kind} size={size} icon={icon}>
        {children}
      </ButtonFace>
    </Link>
  )
}
