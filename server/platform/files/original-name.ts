const longest = 180

/**
 * The name a person gave a file, from the name a form sent. Forms send UTF-8 that arrives read as Latin-1; it is read
 * again when it makes sense so, else left. Folders, control characters and invisible direction marks are taken off;
 * what is longer than 180 characters loses its middle part's end, never its extension.
 */
export function originalName(sent: string): string {
  const last = decoded(sent).normalize('NFC').split(/[/\\]/).at(-1) ?? ''
  const clean = last
    .replace(/\p{Cc}/gu, ' ')
    .replace(/[\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]/g, '')
    .replace(/\s+/g, ' ')
    .trim()
  const characters = [...clean]
  if (characters.length <= longest) return /^\.*$/.test(clean) ? 'file' : clean
  const extension = /\.[A-Za-z0-9]{1,8}$/.exec(clean)?.[0] ?? ''
  return characters.slice(0, longest - extension.length).join('') + extension
}

function decoded(sent: string): string {
  if ([...sent].some((character) => (character.codePointAt(0) ?? 0) > 0xff)) return sent
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(Buffer.from(sent, 'latin1'))
  } catch {
    return sent
  }
}
