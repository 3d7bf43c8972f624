import type { EditionAnnounced } from './editions.contract.ts'

type Listener = (edition: EditionAnnounced) => void

/** What this process knows of the edition in force, and who wants to hear when another one is. */
export class EditionFeed {
  #current: EditionAnnounced | undefined
  readonly #listeners = new Set<Listener>()

  get current(): EditionAnnounced | undefined {
    return this.#current
  }

  /** Tells everyone, when it isn't the one they know. */
  announce({ number, hash }: EditionAnnounced): void {
    if (this.#current?.number === number) return
    this.#current = { number, hash }
    for (const listener of this.#listeners) listener(this.#current)
  }

  /** @returns a function that ends the subscription */
  subscribe(listener: Listener): () => void {
    this.#listeners.add(listener)
    return () => this.#listeners.delete(listener)
  }
}
