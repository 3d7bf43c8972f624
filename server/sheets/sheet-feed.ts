type Listener = () => void

/** Who wants to hear when a sheet is not what it was, or when a person's session has ended; by the id of either. */
export class SheetFeed {
  readonly #listeners = new Map<string, Set<Listener>>()

  /** Tells those who follow this id; `undefined` tells everyone, since anything may have changed. */
  announce(id: string | undefined): void {
    const told = id === undefined ? [...this.#listeners.values()] : [this.#listeners.get(id) ?? []]
    for (const listeners of told) for (const listener of [...listeners]) listener()
  }

  /** @returns a function that ends the subscription */
  subscribe(id: string, listener: Listener): () => void {
    const listeners = this.#listeners.get(id) ?? new Set()
    this.#listeners.set(id, listeners.add(listener))
    return () => {
      listeners.delete(listener)
      if (listeners.size === 0) this.#listeners.delete(id)
    }
  }
}
