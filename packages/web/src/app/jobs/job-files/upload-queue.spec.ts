import { TestBed } from '@angular/core/testing';
import type { UploadedJobFile } from '@bookmatch/common/jobs/job-files-contract';
import { Store } from '@ngrx/store';
import { Subject } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { UploadStep } from '../../platform/api/file-upload';
import { Notices } from '../../platform/page/notices';
import { JobsApiClient } from '../jobs-api';
import { JobsPage } from '../state/jobs.actions';
import { buildJobFile, idOf } from '../testing/build-jobs';
import { UploadQueue } from './upload-queue';

const problem = {
  type: '',
  title: '',
  status: 415,
  code: 'unsupported-type',
  detail: 'This file is none of them.',
};
const jobId = idOf(1);

function setUp() {
  const calls: Subject<UploadStep<UploadedJobFile>>[] = [];
  const upload = jest.fn(() => {
    calls.push(new Subject());
    return calls.at(-1)!;
  });
  const dispatch = jest.fn();
  const say = jest.fn();
  TestBed.configureTestingModule({
    providers: [
      UploadQueue,
      { provide: JobsApiClient, useValue: { upload } },
      { provide: Store, useValue: { dispatch } },
      { provide: Notices, useValue: { say } },
    ],
  });
  const queue = TestBed.inject(UploadQueue);
  const states = () => queue.uploads().map(({ file, state }) => `${file.name} ${state}`);
  return { queue, calls, upload, dispatch, say, states };
}
const files = (...names: string[]) => names.map((name) => new File(['x'], name));

describe('UploadQueue', () => {
  it('sends two at a time, tells how far each is, and goes on to the next', () => {
    const { queue, calls, upload, dispatch, states } = setUp();
    queue.add(jobId, files('a', 'b', 'c'));
    expect(states()).toEqual(['a sending', 'b sending', 'c waiting']);
    calls[0]!.next({ sent: 0.4 });
    expect(queue.uploads()[0]?.sent).toBe(0.4);
    const file = buildJobFile();
    calls[0]!.next({ answer: { ...file, alreadyHere: false } });
    expect(dispatch).toHaveBeenCalledWith(JobsPage.fileUploaded({ jobId, file }));
    expect(states()).toEqual(['b sending', 'c sending']);
    expect(upload).toHaveBeenCalledTimes(3);
  });

  it('keeps what was refused with the sentence why, and sends it again when asked', () => {
    const { queue, calls, upload, states } = setUp();
    queue.add(jobId, files('a'));
    calls[0]!.error(new ApiProblem(problem));
    expect(states()).toEqual(['a failed']);
    expect(queue.uploads()[0]?.problem).toBe(problem.detail);
    queue.retry(queue.uploads()[0]!.key);
    expect(states()).toEqual(['a sending']);
    expect(upload).toHaveBeenCalledTimes(2);
  });

  it('stops what is let go, and does not send what is too large', () => {
    const { queue, calls, upload, states } = setUp();
    const large = new File(['x'], 'large');
    Object.defineProperty(large, 'size', { value: 26 * 1024 * 1024 });
    queue.add(jobId, [large, ...files('a')]);
    expect(states()).toEqual(['large failed', 'a sending']);
    expect(upload).toHaveBeenCalledTimes(1);
    queue.letGo(queue.uploads()[1]!.key);
    expect(calls[0]!.observed).toBe(false);
    expect(states()).toEqual(['large failed']);
  });

  it('says when a file is there already', () => {
    const { queue, calls, say } = setUp();
    queue.add(jobId, files('again.jpg'));
    calls[0]!.next({ answer: { ...buildJobFile(), alreadyHere: true } });
    expect(say).toHaveBeenCalledWith('again.jpg is here already.');
    expect(queue.uploads()).toEqual([]);
  });
});
