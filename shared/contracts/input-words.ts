import { z } from 'zod'
import { inputFaults as words } from '../messages/input-faults.ts'

/** A fault as the schema library finds it, before it has words. */
type Fault = Parameters<z.core.$ZodErrorMap>[0]

const mostChoicesNamed = 8

const byExpected: Record<string, string> = {
  string: words.text,
  number: words.number,
  nan: words.number,
  int: words.wholeNumber,
  bigint: words.wholeNumber,
  boolean: words.yesOrNo,
  array: words.list,
  set: words.list,
  object: words.record,
  record: words.record,
  map: words.record,
  date: words.date,
}

const byFormat: Record<string, string> = {
  email: words.email,
  uuid: words.recordId,
  guid: words.recordId,
  datetime: words.instant,
  date: words.date,
}

function sayType(fault: Extract<Fault, { code: 'invalid_type' }>): string {
  if (typeof fault.input === 'number' && fault.expected === 'int') return words.wholeNumber
  return byExpected[fault.expected] ?? words.otherKind
}

function sayTooSmall({ origin, minimum, inclusive }: Extract<Fault, { code: 'too_small' }>): string {
  if (origin === 'string') return minimum === 1 ? words.needed : words.tooShort({ least: minimum })
  if (origin === 'array' || origin === 'set')
    return minimum === 1 ? words.chooseOne : words.tooFew({ least: minimum })
  return inclusive === false ? words.moreThan({ least: minimum }) : words.least({ least: minimum })
}

function sayTooBig({ origin, maximum, inclusive }: Extract<Fault, { code: 'too_big' }>): string {
  if (origin === 'string') return words.tooLong({ most: maximum })
  if (origin === 'array' || origin === 'set') return words.tooMany({ most: maximum })
  return inclusive === false ? words.lessThan({ most: maximum }) : words.most({ most: maximum })
}

function sayChoice(values: readonly unknown[]): string {
  return values.length <= mostChoicesNamed
    ? words.choiceOf({ values: values.map(String).join(', ') })
    : words.choice
}

/** One value at fault in plain words: a schema that has words of its own keeps them. */
export function sayInputFault(fault: Fault): string {
  if (fault.input === undefined || fault.input === null) return words.needed
  switch (fault.code) {
    case 'invalid_type':
      return sayType(fault)
    case 'too_small':
      return sayTooSmall(fault)
    case 'too_big':
      return sayTooBig(fault)
    case 'not_multiple_of':
      return words.multiple({ of: fault.divisor })
    case 'invalid_format':
      return byFormat[fault.format] ?? words.form
    case 'invalid_value':
      return sayChoice(fault.values)
    case 'unrecognized_keys':
      return words.unknownField
    case 'invalid_union':
      return words.kind
    case 'invalid_key':
    case 'invalid_element':
      return words.form
    default:
      return words.together
  }
}

// the library's own sentences speak of types and are for programmers: no schema of either side ever says them
z.config({ customError: sayInputFault })
