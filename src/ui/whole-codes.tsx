const code = /([A-Z]{1,3}-[A-Z]?\d+)/

/** Words in which a number such as QT-2 or TO-0007 is never broken at its hyphen: half of one is another tank. */
export function WholeCodes({ children }: { children: string }) {
  return children.split(code).map((part, i) =>
    i % 2 === 1 ? (
      <span key={i} className="whitespace-nowrap">
        {part}
      </span>
    ) : (
      part
    ),
  )
}
