/** The mark: a harbour basin open to seaward, a fix in it, and its course running out green. Smallest 20 px. */
export function Mark() {
  return (
    <svg viewBox="0 0 32 32" aria-hidden="true">
      <path d="M22 7.06A12 12 0 1 0 22 24.94" fill="none" stroke="var(--ink)" strokeWidth="3.2" />
      <path d="M20 2.5h5.6V10H20zM20 22h5.6v7.5H20z" fill="var(--ink)" />
      <path d="M13 14.4h19v3.2H13z" fill="var(--green)" />
      <circle cx="13" cy="16" r="3.8" fill="var(--ink)" />
    </svg>
  )
}
