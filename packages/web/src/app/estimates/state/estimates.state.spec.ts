import { buildEstimate, buildRevision, buildRevisionContent } from '@bookmatch/common/testing/build-estimate';
import { EstimatesApi, EstimatesPage } from './estimates.actions';
import { selectEstimate, selectEstimateList, selectRevision } from './estimates.selectors';
import { estimatesFeature, initialEstimates, type EstimatesState } from './estimates.state';

type Action = Parameters<typeof estimatesFeature.reducer>[1];
const run = (...actions: Action[]): EstimatesState =>
  actions.reduce(estimatesFeature.reducer, initialEstimates);

const estimate = buildEstimate();
const draft = { estimateId: estimate.id, revisionId: estimate.currentRevision.id };
const opened = EstimatesApi.estimateLoaded({ estimate });
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const find = (state: EstimatesState) => selectEstimate(estimate.id)({ estimates: state });

describe('estimates', () => {
  it('shows the list as loading until the first answer', () => {
    expect(selectEstimateList({ estimates: run() }).loading).toBe(true);
    const page = { rows: [], next: null, total: 0 };
    expect(selectEstimateList({ estimates: run(EstimatesApi.listLoaded({ page })) }).loading).toBe(false);
  });

  it('takes a saved draft as the current revision, its price into the history', () => {
    const { currentRevision } = estimate;
    const revision = buildRevision({ ...buildRevisionContent(), discountCents: 700, id: currentRevision.id });
    const state = run(opened, EstimatesApi.draftSaved({ draft, revision: { ...revision, version: 2 } }));
    expect(find(state)?.currentRevision.version).toBe(2);
    expect(find(state)?.revisions[0]?.totalCents).toBe(revision.totals.totalCents);
    expect(state.draft.status).toBe('saved');
  });

  it('keeps why a draft was not saved until the editor is opened again', () => {
    const failed = run(opened, EstimatesApi.draftFailed({ draft, problem }));
    expect(failed.draft).toEqual({ status: 'failed', problem });
    expect(estimatesFeature.reducer(failed, EstimatesPage.editorOpened()).draft.status).toBe('idle');
  });

  it('puts an answer beside its question', () => {
    const question = {
      ...{ id: 'q1', body: 'Oak?', askedAt: '2026-03-05T15:00:00.000Z' },
      ...{ answer: null, answeredBy: null, answeredAt: null },
    };
    const asked = EstimatesApi.estimateLoaded({ estimate: { ...estimate, questions: [question] } });
    const answered = { ...question, answer: 'Oak.', answeredBy: 'Ada', answeredAt: question.askedAt };
    const state = run(asked, EstimatesApi.answered({ estimateId: estimate.id, question: answered }));
    expect(find(state)?.questions).toEqual([answered]);
  });

  it('shows the address of a new link once, and forgets it when the links are opened again', () => {
    const made = {
      ...{ id: 'l1', subject: 'estimate' as const, subjectId: estimate.id, url: 'https://shop.test/c/x' },
      ...{ createdAt: '', expiresAt: '', revokedAt: null, lastSeenAt: null },
    };
    const { url, ...link } = made;
    const state = run(EstimatesApi.linkMade({ link: made }));
    expect(state).toMatchObject({ newLinkUrl: url, links: [link] });
    const again = estimatesFeature.reducer(state, EstimatesPage.linksOpened({ estimateId: estimate.id }));
    expect(again).toMatchObject({ newLinkUrl: null, links: [] });
  });

  it('finds the current revision, or an older one that was loaded', () => {
    const older = buildRevision({ number: 1 });
    const state = { estimates: run(opened, EstimatesApi.revisionLoaded({ revision: older })) };
    expect(selectRevision(estimate.id, null)(state)).toBe(estimate.currentRevision);
    expect(selectRevision(estimate.id, older.id)(state)).toBe(older);
    expect(selectRevision(estimate.id, 'another')(state)).toBeNull();
  });
});
