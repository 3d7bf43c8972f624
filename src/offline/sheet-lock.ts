const name = 'tracelamp-sheet-open'

/** Where there are workers there are locks; both are missing on plain HTTP. */
const locks = (): LockManager | undefined => ('locks' in navigator ? navigator.locks : undefined)

/**
 * Says, to every tab, that a sheet is open in this one.
 * @returns the way to say that it no longer is
 */
export function holdSheet(): () => void {
  const done = new AbortController()
  const untilDone = new Promise<void>((resolve) => done.signal.addEventListener('abort', () => resolve()))
  locks()
    ?.request(name, { mode: 'shared' }, () => untilDone)
    .catch(() => undefined)
  return () => done.abort()
}

/** Runs something if no tab has a sheet open at this moment. */
export async function whenNoSheetIsOpen(run: () => void): Promise<void> {
  await locks()?.request(name, { ifAvailable: true }, (lock) => {
    if (lock !== null) run()
  })
}
