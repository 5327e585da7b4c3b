type Schema = Readonly<Record<string, unknown>>

/** One line of the table of what a body or a reply holds. */
export interface FieldLine {
  /** Path within it: `target.value`, `rows[].name`. Empty for the whole of it. */
  path: string
  type: string
  meaning: string
  optional: boolean
}

const isSchema = (value: unknown): value is Schema =>
  typeof value === 'object' && value !== null && !Array.isArray(value)
const schemas = (value: unknown): Schema[] => (Array.isArray(value) ? value.filter(isSchema) : [])
const text = (value: unknown): string => (typeof value === 'string' ? value : '')

/** Deeper than this a reply is better read from the machine's own description. */
const deepest = 5

/**
 * Every field of a JSON Schema, in the order in which it stands there, with its type and meaning in one line.
 *
 * @param schema inlined, without references, as zod writes it
 */
export function listFields(schema: Schema, path = '', optional = false, depth = 0): FieldLine[] {
  const own = { path, type: typeOf(schema), meaning: text(schema.description), optional }
  if (depth > deepest) return [own]
  const variants = schemas(schema.anyOf ?? schema.oneOf).filter((each) => each.type !== 'null')
  const below = [
    ...variants.flatMap((each) => (hasFields(each) ? fieldsOf(each, labelled(path, each), depth) : [])),
    ...fieldsOf(schema, path, depth),
  ]
  return path === '' && own.meaning === '' && below.length > 0 ? below : [own, ...below]
}

const hasFields = (schema: Schema): boolean =>
  isSchema(schema.properties) || isSchema(schema.items) || isSchema(schema.additionalProperties)

function fieldsOf(schema: Schema, path: string, depth: number): FieldLine[] {
  const { properties, items, additionalProperties } = schema
  const required = Array.isArray(schema.required) ? schema.required : []
  const named = isSchema(properties)
    ? Object.entries(properties).flatMap(([name, each]) =>
        isSchema(each)
          ? listFields(each, path === '' ? name : `${path}.${name}`, !required.includes(name), depth + 1)
          : [],
      )
    : []
  const listed = isSchema(items) && hasMore(items) ? inside(items, `${path}[]`, depth) : []
  const keyed =
    isSchema(additionalProperties) && hasMore(additionalProperties)
      ? inside(additionalProperties, `${path}.*`, depth)
      : []
  return [...named, ...listed, ...keyed]
}

const hasMore = (schema: Schema): boolean =>
  hasFields(schema) || schemas(schema.anyOf ?? schema.oneOf).some(hasFields)

// what a list is of has no name of its own: its fields follow the list's line
function inside(schema: Schema, path: string, depth: number): FieldLine[] {
  return listFields(schema, path, false, depth + 1).filter((line) => line.path !== path)
}

/** Variants are told apart by the fixed word of one of their fields: `event(closed)`. */
function labelled(path: string, schema: Schema): string {
  const properties = isSchema(schema.properties) ? Object.values(schema.properties) : []
  const fixed = properties.find((each): each is Schema => isSchema(each) && typeof each.const === 'string')
  return fixed ? `${path}(${text(fixed.const)})` : path
}

/** A type as people read it: `number, 0 or more`, `one of: a, b`, `list`. */
function typeOf(schema: Schema): string {
  if (schema.const !== undefined) return `always ${JSON.stringify(schema.const)}`
  if (Array.isArray(schema.enum)) return `one of: ${schema.enum.join(', ')}`
  const variants = schemas(schema.anyOf ?? schema.oneOf)
  if (variants.length > 0) return [...new Set(variants.map(typeOf))].join(' or ')
  if (Array.isArray(schema.type))
    return schema.type.map((each: unknown) => typeOf({ ...schema, type: each })).join(' or ')
  if (schema.type === undefined) return 'anything'
  if (schema.type === 'array') return 'list'
  if (schema.type === 'null') return 'null'
  const kind = schema.type === 'integer' ? 'whole number' : text(schema.type)
  const format = schema.format === undefined ? '' : ` (${text(schema.format)})`
  return `${kind}${format}${limitsOf(schema)}`
}

const farthest = Number.MAX_SAFE_INTEGER

function limitsOf(schema: Schema): string {
  const { minimum, exclusiveMinimum, maximum, maxLength } = schema
  return [
    typeof minimum === 'number' && minimum > -farthest ? `, ${String(minimum)} or more` : '',
    typeof exclusiveMinimum === 'number' ? `, more than ${String(exclusiveMinimum)}` : '',
    typeof maximum === 'number' && maximum < farthest ? `, ${String(maximum)} at most` : '',
    typeof maxLength === 'number' ? `, ${String(maxLength)} characters at most` : '',
  ].join('')
}
