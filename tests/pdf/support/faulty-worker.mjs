/** A worker thread that misbehaves as the document's title asks it to; any other title is answered with its length. */
import { parentPort } from 'node:worker_threads'

parentPort.on('message', ({ id, model }) => {
  if (model.title === 'exit') process.exit(3)
  if (model.title === 'throw') throw new Error('thrown in the thread')
  if (model.title === 'fail') parentPort.postMessage({ id, failed: 'Error: drawn wrongly' })
  else if (model.title !== 'hang') parentPort.postMessage({ id, bytes: new Uint8Array([model.title.length]) })
})
