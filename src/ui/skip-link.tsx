import { partWords } from '../../shared/messages/parts.ts'

/** First stop of the page: past the bridge and the ruler to the work. */
export function SkipLink() {
  return (
    <a
      className="skip-link"
      href="#chart"
      onClick={(event) => {
        // the address bar belongs to the router
        event.preventDefault()
        document.getElementById('chart')?.focus()
      }}
    >
      {partWords.skipToChart}
    </a>
  )
}
