const quietMs = 400
const againMs = 10_000

const seconds = (since) => `${Math.round((Date.now() - since) / 100) / 10} s`

/**
 * Does a piece of work and says so when it takes long: a line when it does not end at once, one every ten seconds,
 * and one at the end.
 */
export async function step(words, work) {
  const since = Date.now()
  let said = false
  const first = setTimeout(() => {
    said = true
    console.log(`${words} …`)
  }, quietMs)
  const again = setInterval(() => console.log(`${words}: still at it after ${seconds(since)}`), againMs)
  try {
    const result = await work()
    if (said) console.log(`${words}: done in ${seconds(since)}`)
    return result
  } finally {
    clearTimeout(first)
    clearInterval(again)
  }
}
