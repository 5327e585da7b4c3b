import { createHash } from 'node:crypto'
import pg from 'pg'

/** More distinct texts than the application has: a bound for the memory of a connection, not a limit that is reached. */
const mostStatements = 500

const nameOf = (text: string) => createHash('sha256').update(text).digest('hex').slice(0, 32)

/**
 * A connection on which a read that comes again is planned once: each is sent under a name made from its text, which
 * PostgreSQL keeps with its plan. Planning a read over a dozen views takes longer than running it on the rows of one
 * facility. What writes, and what is not a single text, is sent as it comes.
 */
export class PreparingClient extends pg.Client {
  readonly #names = new Map<string, string>()

  // pg states a dozen overloads; what matters here is whether the first argument is a text. All else is passed on
  override query(...args: unknown[]): never {
    const [text, values, ...rest] = args
    const name =
      typeof text === 'string' && (values === undefined || Array.isArray(values)) ? this.#nameFor(text) : null
    const sent = name === null ? args : [{ name, text, values }, ...rest]
    return (super.query as (...sent: unknown[]) => unknown).apply(this, sent) as never
  }

  #nameFor(text: string): string | null {
    const known = this.#names.get(text)
    if (known !== undefined) return known
    if (!/^\s*(SELECT|WITH)\b/i.test(text) || text.includes(';') || this.#names.size >= mostStatements)
      return null
    const name = nameOf(text)
    this.#names.set(text, name)
    return name
  }
}
