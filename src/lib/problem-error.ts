import { Problem } from '#shared/api/problem.ts';

/** What the server answered instead of a reply. Screens switch on `code`; `detail` is a sentence to show. */
export class ProblemError extends Error {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail);
    this.name = 'ProblemError';
    this.problem = problem;
  }

  get code(): Problem['code'] {
    return this.problem.code;
  }
}

/** The server could not be reached at all: no signal, or it is down. */
export class Unreachable extends Error {
  constructor() {
    super('The server cannot be reached. What you see is the last that was read.');
    this.name = 'Unreachable';
  }
}

/** The problem of an answer that is not a reply; one made up from the status where the body is not a problem. */
export async function readProblem(response: Response): Promise<ProblemError> {
  const text = await response.text().catch(() => '');
  const parsed = Problem.safeParse(parseJson(text));
  if (parsed.success) return new ProblemError(parsed.data);
  return new ProblemError({
    type: 'about:blank',
    title: response.statusText || 'Problem',
    status: response.status,
    code: codeOfStatus(response.status),
    detail: sentenceOfStatus(response.status),
  });
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function codeOfStatus(status: number): Problem['code'] {
  if (status === 401) return 'not-signed-in';
  if (status === 403) return 'forbidden';
  if (status === 404 || status === 410) return 'not-found';
  if (status === 409) return 'conflict';
  if (status === 429) return 'too-many-requests';
  if (status === 502 || status === 503 || status === 504) return 'unavailable';
  if (status >= 400 && status < 500) return 'invalid';
  return 'internal';
}

function sentenceOfStatus(status: number): string {
  if (status === 429) return 'Too many tries. Wait a minute and try again.';
  if (status >= 500) return 'The server could not answer. What was saved is safe; try again.';
  return 'The server did not accept this.';
}
