/** A page to the worker that waits: no sheet is open any more, or the person said so. */
export const takeOver = 'take over'
/** From the worker that the server sends when workers are switched off (`server/worker-off.ts`). */
export const workerLeft = 'the worker left'
