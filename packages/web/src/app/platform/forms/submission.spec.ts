import { of, Subject, throwError } from 'rxjs';
import { ApiProblem } from '../api/api-problem';
import { Submission } from './submission';

const refusal = { type: '', title: '', status: 409, code: 'conflict', detail: 'Not now.' };

describe('Submission', () => {
  it('is busy until the answer is there, and takes no second press meanwhile', () => {
    const submission = new Submission();
    const answer = new Subject<string>();
    const done = jest.fn();
    submission.run(answer, done);
    expect(submission.busy()).toBe(true);
    submission.run(of('second'), done);
    answer.next('first');
    expect(done.mock.calls).toEqual([['first']]);
    expect(submission.busy()).toBe(false);
  });

  it('keeps the refusal until the next try', () => {
    const submission = new Submission();
    submission.run(
      throwError(() => new ApiProblem(refusal)),
      () => undefined,
    );
    expect(submission.problem()).toBe(refusal);
    submission.run(of('ok'), () => undefined);
    expect(submission.problem()).toBeNull();
  });
});
