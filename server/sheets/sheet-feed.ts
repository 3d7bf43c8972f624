type Listener = () => void

/** Who wants to hear when a sheet is not what it was. */
export class SheetFeed {
  readonly #listeners = new Map<string, Set<Listener>>()

  /** Tells those who follow a sheet; `undefined` tells everyone, since anything may have changed. */
  announce(sheetId: string | undefined): void {
    const told = sheetId === undefined ? [...this.#listeners.values()] : [this.#listeners.get(sheetId) ?? []]
    for (const listeners of told) for (const listener of listeners) listener()
  }

  /** @returns a function that ends the subscription */
  subscribe(sheetId: string, listener: Listener): () => void {
    const listeners = this.#listeners.get(sheetId) ?? new Set()
    this.#listeners.set(sheetId, listeners.add(listener))
    return () => {
      listeners.delete(listener)
      if (listeners.size === 0) this.#listeners.delete(sheetId)
    }
  }
}
