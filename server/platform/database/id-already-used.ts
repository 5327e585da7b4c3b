import { sentBefore } from '../../../shared/messages/problems.ts'
import { Problem } from '../http/problem.ts'

/** The refusal of other content under the id of a record that is there already. */
export const idAlreadyUsed = () => new Problem('id-already-used', { detail: sentBefore.whatToDo })
