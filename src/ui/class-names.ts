/** Joins the class names that apply; falsy ones are left out. */
export function classNames(...names: (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(' ')
}
