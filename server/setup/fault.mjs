/** A reason to stop that is said in one line, without a stack. */
export class Fault extends Error {
  name = 'Fault'
}

/** Says on standard error why it stops. */
export const sayWhy = (error) => console.error(error instanceof Fault ? error.message : error)
