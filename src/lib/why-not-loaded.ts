/** Why a script of this application did not come. */
export type NotLoaded = 'no-signal' | 'new-version' | 'unknown'

/** A script that was asked for and did not come, as each browser says it. */
export function isNotLoaded(error: unknown): boolean {
  return (
    error instanceof Error &&
    /dynamically imported module|Importing a module script failed|Unable to preload CSS/i.test(error.message)
  )
}

/** The script that a page begins with; its name changes with every version. */
const beginning = (page: Document): string | null =>
  page.querySelector('script[type="module"][src]')?.getAttribute('src') ?? null

/**
 * Asks the server which version it has now: nobody knows otherwise why a script is missing.
 *
 * @param here the page that is open
 */
export async function whyNotLoaded(here: Document = document): Promise<NotLoaded> {
  try {
    const answer = await fetch('/', { cache: 'no-store', signal: AbortSignal.timeout(5000) })
    if (!answer.ok) return 'no-signal'
    const there = beginning(new DOMParser().parseFromString(await answer.text(), 'text/html'))
    return there !== beginning(here) ? 'new-version' : 'unknown'
  } catch {
    return 'no-signal'
  }
}
