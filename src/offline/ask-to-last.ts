/** The browser's storage. Like the worker's, this part of it is missing on plain HTTP. */
export const storage = (): StorageManager | undefined =>
  'storage' in navigator ? navigator.storage : undefined

/** Asks the browser not to clear this device's sheets when it runs full. Some ask the person in turn. */
export async function askToLast(): Promise<void> {
  const here = storage()
  if (here !== undefined && !(await here.persisted())) await here.persist()
}
