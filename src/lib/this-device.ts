const longest = 100

/** What this device calls itself, kept with what was entered on it: browser and system, no name of a person. */
export function thisDevice(): string {
  return navigator.userAgent.replace(/^Mozilla\/5\.0 /, '').slice(0, longest)
}
