import { peopleWords } from '../../../shared/messages/people.ts'

/** A one-time password, shown once to whoever made it. */
export function OneTimePassword({ name, password }: { name: string; password: string | null }) {
  return (
    <section className="stack border-2 border-ink p-4" role="status">
      <h2 className="t-head">{peopleWords.oneTimeTitle}</h2>
      {password === null ? (
        <p>{peopleWords.oneTimeShownBefore}</p>
      ) : (
        <>
          <p className="t-second num">{password}</p>
          <p className="t-2">{peopleWords.oneTimeText({ name })}</p>
        </>
      )}
    </section>
  )
}
