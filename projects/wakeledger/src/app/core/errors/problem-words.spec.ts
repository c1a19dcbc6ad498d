import { PROBLEMS, type ProblemCode } from '#shared/contracts/problem';
import { ApiProblem } from '../api/api-problem';
import { problemWords } from './problem-words';

const problem = (code: ProblemCode, more: object = {}): ApiProblem =>
  new ApiProblem(code, {
    type: `/problems/${code}`,
    title: 't',
    status: PROBLEMS[code].status,
    code,
    ...more,
  });

describe('a problem in words', () => {
  it('has a sentence for every code of the contract', () => {
    for (const code of Object.keys(PROBLEMS) as ProblemCode[]) {
      expect(problemWords(problem(code)).title).toMatch(/[a-z].*\.$/);
    }
  });

  it('says how long to wait', () => {
    expect(problemWords(problem('too-many-attempts', { retryAfterS: 40 })).detail).toBe(
      'Try again in 40 seconds.',
    );
    expect(problemWords(problem('too-many-attempts', { retryAfterS: 300 })).detail).toBe(
      'Try again in 5 minutes.',
    );
  });

  it('names the request where the fault is ours, and nothing else of it', () => {
    const words = problemWords(problem('internal-error', { requestId: 'r-7', detail: 'stack' }));
    expect(words).toEqual({ title: 'Something went wrong on our side.', requestId: 'r-7' });
  });

  it('keeps the server’s words about what was wrong', () => {
    expect(problemWords(problem('unusable-input', { detail: 'Shares sum to 1.1.' })).detail).toBe(
      'Shares sum to 1.1.',
    );
  });
});
