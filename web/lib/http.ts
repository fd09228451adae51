import * as z from 'zod';

/** A problem document (RFC 9457) as the API sends it; members it adds beyond the standard ones are kept. */
const Problem = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
});
export type Problem = z.infer<typeof Problem>;

/** The server answered, and said no. `problem` is its own words; the interface decides what to do with them. */
export class ProblemError extends Error {
  override name = 'ProblemError';
  readonly problem: Problem;
  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.problem = problem;
  }
  /** The last part of the type: `stale-version`, `not-found` … */
  get kind(): string {
    return this.problem.type.split('/').at(-1) ?? '';
  }
}

/** No answer came: off line, or the server is down. What was typed is still here; asking again may help. */
export class UnreachableError extends Error {
  override name = 'UnreachableError';
}

export interface SendOptions {
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Sent as JSON, unless it is a form. */
  body?: unknown;
  /** The version that was read: sent as `If-Match`, so that nobody's save is overwritten. */
  version?: number;
  headers?: Record<string, string>;
  signal?: AbortSignal;
}

/**
 * Sends a request to our own API and reads the answer by the contract. An empty answer (204) is read as `undefined`.
 *
 * @throws ProblemError the server refused
 * @throws UnreachableError no answer came
 * @throws z.ZodError the answer is not what the contract says (a bug on one of the two sides)
 */
export async function send<S extends z.ZodType>(
  schema: S,
  url: string,
  options: SendOptions = {},
): Promise<z.output<S>> {
  const response = await ask(url, options);
  if (!response.ok) throw new ProblemError(await readProblem(response));
  return schema.parse(response.status === 204 ? undefined : await response.json());
}

async function ask(url: string, { method = 'GET', body, version, headers, signal }: SendOptions): Promise<Response> {
  const isForm = body instanceof FormData;
  const request: RequestInit = {
    method,
    credentials: 'same-origin',
    headers: { Accept: 'application/json', ...headers },
  };
  const head = request.headers as Record<string, string>;
  if (version !== undefined) head['If-Match'] = `"${version}"`;
  if (body !== undefined) {
    if (!isForm) head['Content-Type'] = 'application/json';
    request.body = isForm ? body : JSON.stringify(body);
  }
  if (signal) request.signal = signal;
  try {
    return await fetch(url, request);
  } catch (cause) {
    if (signal?.aborted) throw cause;
    throw new UnreachableError('The server did not answer.', { cause });
  }
}

async function readProblem(response: Response): Promise<Problem> {
  const body: unknown = await response.json().catch(() => undefined);
  const problem = Problem.safeParse(body);
  if (problem.success) return problem.data;
  return { type: 'about:blank', title: 'The server could not do that', status: response.status };
}
