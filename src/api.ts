import * as z from 'zod/mini'

/** A refusal, as the server words it (RFC 9457). */
export class ApiProblem extends Error {
  override name = 'ApiProblem'
  readonly status: number
  readonly title: string
  /** Field path → sentence. */
  readonly errors: Readonly<Record<string, string>>
  /** What else came with it; read it with its own contract. */
  readonly also: unknown
  constructor(status: number, title: string, errors: Readonly<Record<string, string>> = {}, also?: unknown) {
    super(title)
    this.status = status
    this.title = title
    this.errors = errors
    this.also = also
  }
}

/** Nobody answered, or something that is not our server did (a hotel's sign-in page is a 200 too). */
export class NoNetwork extends Error {
  override name = 'NoNetwork'
  constructor(cause?: unknown) {
    super('No network.', { cause })
  }
}

const Problem = z.object({ title: z.string(), errors: z.optional(z.record(z.string(), z.string())) })
const patienceMs = 20_000

/** What goes along with a request: headers, and whether it goes out in the name of whoever is signed in. */
export type Along = { headers?: Readonly<Record<string, string>>; credentials?: 'same-origin' | 'omit' }
type Asked = { accept: string; method?: string; body?: unknown; along?: Along | undefined }

async function ask(
  path: string,
  { accept, method = 'GET', body, along = {} }: Asked,
  signal?: AbortSignal,
): Promise<Response> {
  const patience = AbortSignal.timeout(patienceMs)
  const either = signal === undefined ? patience : AbortSignal.any([signal, patience])
  let answer: Response
  try {
    const sent = method === 'GET' ? {} : { body: JSON.stringify(body ?? {}) }
    const json = method !== 'GET' && { 'content-type': 'application/json' }
    const headers = { accept, ...json, ...along.headers }
    const { credentials = 'same-origin' } = along
    answer = await fetch(`/api${path}`, { method, headers, credentials, signal: either, ...sent })
  } catch (problem) {
    if (signal?.aborted === true) throw problem
    throw new NoNetwork(problem)
  }
  if (answer.ok) return answer
  const also: unknown = await answer.json().catch(() => undefined)
  const said = Problem.safeParse(also)
  throw said.success
    ? new ApiProblem(answer.status, said.data.title, said.data.errors, also)
    : new ApiProblem(answer.status, `The server answered with ${answer.status}.`)
}

/**
 * Asks the server and reads its answer with its own contract.
 * @param path what follows `/api`, for example `/edition`
 * @throws ApiProblem when it refuses or answers something else than agreed; NoNetwork when nobody answers
 */
export async function get<Contract extends z.ZodMiniType>(
  path: string,
  contract: Contract,
  signal?: AbortSignal,
): Promise<z.output<Contract>> {
  return read(await ask(path, { accept: 'application/json' }, signal), contract)
}

/**
 * Sends something to the server and reads its answer with its own contract.
 * @param path what follows `/api`, for example `/sign-in`
 * @throws ApiProblem when it refuses, with a sentence for each field at fault; NoNetwork when nobody answers
 */
export async function send<Contract extends z.ZodMiniType>(
  method: 'POST' | 'PATCH' | 'PUT' | 'DELETE',
  path: string,
  body: unknown,
  contract: Contract,
  along?: Along,
): Promise<z.output<Contract>> {
  return read(await ask(path, { accept: 'application/json', method, body, along }), contract)
}

async function read<Contract extends z.ZodMiniType>(
  answer: Response,
  contract: Contract,
): Promise<z.output<Contract>> {
  if (answer.headers.get('content-type')?.includes('json') !== true) throw new NoNetwork()
  const said = contract.safeParse(await answer.json().catch(() => undefined))
  if (said.success) return said.data
  throw new ApiProblem(answer.status, 'The server and this page don’t match. Load the page again.')
}

const Health = z.object({ status: z.literal('up') })

/** Whether our server answers, now. */
export const serverAnswers = (): Promise<boolean> =>
  get('/health', Health).then(
    () => true,
    () => false,
  )

/**
 * Fetches a file as it is, to be checked against its hash by whoever asked.
 * @param path what follows `/api`, for example `/edition-files/<hash>`
 */
export async function getBytes(path: string): Promise<Uint8Array> {
  const answer = await ask(path, { accept: '*/*' })
  try {
    return new Uint8Array(await answer.arrayBuffer())
  } catch (problem) {
    throw new NoNetwork(problem)
  }
}
