import type { FieldProblem } from '@/lib/errors';

interface ProblemBody { type?: string; title: string; status: number; detail: string; errors: FieldProblem[] }

/** What the server answered instead of a result (RFC 9457). */
export class ApiProblem extends Error {
  constructor(readonly problem: ProblemBody) {
    super(problem.detail);
    this.name = 'ApiProblem';
  }

  /** The code of the table of problems, such as not-signed-in. */
  get code(): string | undefined {
    return this.problem.type?.split('#')[1];
  }

  static async from(response: Response): Promise<ApiProblem> {
    const isProblem = response.headers.get('content-type')?.startsWith('application/problem+json') ?? false;
    if (isProblem) return new ApiProblem((await response.json()) as ProblemBody);
    return new ApiProblem({
      title: 'No readable answer', status: response.status, errors: [],
      detail: `The server answered ${response.status} without saying why. Try again in a moment.`,
    });
  }
}
