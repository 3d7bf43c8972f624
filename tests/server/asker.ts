import demoPeople from '../../server/people/demo-people.json' with { type: 'json' }
import type { Role } from '../../server/people/roles.contract.ts'

type Asked = { body?: unknown; headers?: Record<string, string> }

/** Someone at a browser: keeps cookies, and says what a page of ours says with what it sends. */
export class Asker {
  readonly #jar = new Map<string, string>()
  readonly #url: string
  constructor({ url }: { url: string }) {
    this.#url = url
  }

  cookie(): string {
    return [...this.#jar].map(([name, value]) => `${name}=${value}`).join('; ')
  }
  cookieNamed(name: string): string | undefined {
    return this.#jar.get(name)
  }
  setCookie(name: string, value: string): void {
    this.#jar.set(name, value)
  }

  async ask(method: string, path: string, { body, headers = {} }: Asked = {}): Promise<Response> {
    const sends = method !== 'GET'
    const answer = await fetch(`${this.#url}${path}`, {
      method,
      redirect: 'manual',
      headers: {
        ...(sends && { 'content-type': 'application/json', 'sec-fetch-site': 'same-origin' }),
        ...(this.#jar.size > 0 && { cookie: this.cookie() }),
        ...headers,
      },
      ...(sends && { body: typeof body === 'string' ? body : JSON.stringify(body ?? {}) }),
    })
    for (const line of answer.headers.getSetCookie()) {
      const [, name, value] = /^([^=]+)=([^;]*)/.exec(line)!
      if (/expires=thu, 01 jan 1970/i.test(line)) this.#jar.delete(name!)
      else this.#jar.set(name!, value!)
    }
    return answer
  }

  get(path: string): Promise<Response> {
    return this.ask('GET', path)
  }
  post(path: string, body?: unknown): Promise<Response> {
    return this.ask('POST', path, { body })
  }

  /** The e-mail address of whoever is signed in; null for nobody. */
  async whoAmI(): Promise<string | null> {
    const { person } = (await (await this.get('/api/me')).json()) as { person: { email: string } | null }
    return person?.email ?? null
  }
}

/** The e-mail address and password of the demo person with a role. */
export const demoPerson = (role: Role) => {
  const { email, password } = demoPeople.find((person) => person.role === role)!
  return { email, password }
}

/** A demo person, signed in. */
export async function signedIn(app: { url: string }, role: Role): Promise<Asker> {
  const asker = new Asker(app)
  const answer = await asker.post('/api/sign-in', demoPerson(role))
  // Read to its end, which comes once the session is written.
  const said = await answer.text()
  if (answer.status !== 200) throw new Error(`${role} was not let in: ${said}`)
  return asker
}
