/** Asks again and again until there is an answer. */
export async function until<T>(
  ask: () => T | undefined | Promise<T | undefined>,
  patienceMs = 10_000,
): Promise<T> {
  const end = Date.now() + patienceMs
  for (;;) {
    const answer = await ask()
    if (answer !== undefined) return answer
    if (Date.now() > end) throw new Error(`nothing came in ${patienceMs} ms`)
    await new Promise((resume) => setTimeout(resume, 20))
  }
}
