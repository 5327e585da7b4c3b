import type { ReactNode } from 'react'

/** Q in quarantine · L held, no movement · C cleared or valid · N not cleared or not valid */
export type Flag = 'Q' | 'L' | 'C' | 'N'

const blue = 'var(--flag-blue)'
const white = 'var(--flag-white)'

const drawings: Record<Flag, ReactNode> = {
  Q: <path d="M0 0h16v16H0z" fill="var(--q)" />,
  L: (
    <>
      <path d="M0 0h8v8H0zM8 8h8v8H8z" fill="var(--q)" />
      <path d="M8 0h8v8H8zM0 8h8v8H0z" fill="var(--flag-black)" />
    </>
  ),
  C: (
    <>
      <path d="M0 0h16v16H0z" fill={white} />
      <path d="M0 0h16v3.2H0zM0 12.8h16V16H0z" fill={blue} />
      <path d="M0 6.4h16v3.2H0z" fill="var(--flag-red)" />
    </>
  ),
  N: (
    <>
      <path d="M0 0h16v16H0z" fill={white} />
      <path
        d="M0 0h4v4H0zM8 0h4v4H8zM4 4h4v4H4zM12 4h4v4h-4zM0 8h4v4H0zM8 8h4v4H8zM4 12h4v4H4zM12 12h4v4h-4z"
        fill={blue}
      />
    </>
  ),
}

/** A signal flag. It says nothing to readers; the words beside it do, so use `FlagWords` wherever words fit. */
export function FlagMark({ flag }: { flag: Flag }) {
  return (
    <svg className="flag-mark" viewBox="0 0 16 16" aria-hidden="true">
      {drawings[flag]}
      <rect x=".5" y=".5" width="15" height="15" fill="none" stroke="var(--ink)" />
    </svg>
  )
}

/** A flag with the words that carry the meaning: "In quarantine, Q-115". */
export function FlagWords({ flag, children }: { flag: Flag; children: ReactNode }) {
  return (
    <span className="flag-words">
      <FlagMark flag={flag} />
      <span>{children}</span>
    </span>
  )
}
