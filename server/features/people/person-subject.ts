/** A person as the audit trail names them. */
export const personSubject = (person: { id: string; printedName: string }) => ({
  kind: 'person',
  id: person.id,
  label: person.printedName,
})
