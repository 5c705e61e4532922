import type { LeadNote } from '@bookmatch/common/leads/leads-contract';
import { buildLead, buildLeadRow } from '@bookmatch/common/testing/build-lead';
import { nextId } from '@bookmatch/common/testing/ids';
import { LeadsApi, LeadsPage } from './leads.actions';
import { selectLead, selectLeadBoard, selectLeadList, selectSave, selectTimeline } from './leads.selectors';
import { initialLeads, leadsFeature, type LeadsState } from './leads.state';

type Action = Parameters<typeof leadsFeature.reducer>[1];
const run = (...actions: Action[]): LeadsState => actions.reduce(leadsFeature.reducer, initialLeads);

const row = buildLeadRow({ expectedCents: 200_000 });
const board = {
  columns: [
    { stage: 'new' as const, count: 33, rows: [row], expectedCents: 200_000 },
    { stage: 'contacted' as const, count: 0, rows: [], expectedCents: 0 },
  ],
};
const problem = { type: '', title: '', status: 412, code: 'stale-version', detail: 'Somebody changed this.' };
const boardOf = (state: LeadsState) => selectLeadBoard({ leads: state });

describe('leads in the store', () => {
  it('puts a picked card into its column at once and holds it until the server answered', () => {
    const picked = run(
      LeadsApi.boardLoaded({ board }),
      LeadsPage.stagePicked({ lead: row, stage: 'contacted' }),
    );
    const [from, to] = boardOf(picked).columns;
    expect([from?.count, to?.count]).toEqual([32, 1]);
    expect(to?.rows[0]).toMatchObject({ id: row.id, stage: 'contacted', busy: true });
    const lead = buildLead({ ...row, stage: 'contacted', version: 2 });
    const answered = leadsFeature.reducer(picked, LeadsApi.stageChanged({ lead }));
    expect(boardOf(answered).columns[1]?.rows[0]).toMatchObject({ version: 2, busy: false });
  });

  it('lets a card go that was refused', () => {
    const state = run(
      LeadsApi.boardLoaded({ board }),
      LeadsPage.winConfirmed({ lead: row }),
      LeadsApi.stageRefused({ id: row.id, problem }),
    );
    expect(state.moving).toEqual([]);
  });

  it('says how many more a column has, and when there is nothing at all', () => {
    expect(boardOf(run(LeadsApi.boardLoaded({ board }))).columns[0]?.more).toBe(32);
    expect(boardOf(run()).empty).toBe(false);
    expect(boardOf(run(LeadsApi.boardLoaded({ board: { columns: [] } }))).empty).toBe(true);
  });

  it('shows a newer lead in the list too', () => {
    const lead = buildLead({ ...row, title: 'Renamed', version: 2 });
    const state = run(
      LeadsApi.listLoaded({ page: { rows: [row], next: null, total: 1 } }),
      LeadsApi.saved({ form: 'next-step', lead }),
    );
    expect(selectLeadList({ leads: state }).rows[0]).toMatchObject({ title: 'Renamed', version: 2 });
    expect(selectLead(lead.id)({ leads: state })).toEqual(lead);
    expect(selectSave('next-step')({ leads: state }).status).toBe('saved');
    expect(selectSave('lead')({ leads: state }).status).toBe('idle');
  });

  it('shows only the notes of the lead that is open', () => {
    const lead = buildLead();
    const note: LeadNote = { id: nextId(), body: 'Call', by: 'Ada', createdAt: '2027-01-11T15:00:00.000Z' };
    const opened = run(
      LeadsPage.leadOpened({ id: lead.id }),
      LeadsApi.leadLoaded({ lead }),
      LeadsApi.notesLoaded({ leadId: 'another', notes: [note] }),
    );
    expect(selectTimeline(lead.id)({ leads: opened })).toEqual([]);
    const added = leadsFeature.reducer(opened, LeadsApi.noteAdded({ leadId: lead.id, note }));
    expect(selectTimeline(lead.id)({ leads: added })).toHaveLength(1);
    expect(selectSave('note')({ leads: added }).status).toBe('saved');
    const other = leadsFeature.reducer(added, LeadsPage.leadOpened({ id: 'another' }));
    expect(other.notes.notes).toEqual([]);
  });

  it('forgets an old refusal when the form is opened again', () => {
    const refused = run(LeadsApi.saveFailed({ form: 'loss', id: row.id, problem }));
    expect(refused.saves.loss).toEqual({ status: 'failed', problem });
    expect(leadsFeature.reducer(refused, LeadsPage.formOpened({ form: 'loss' })).saves.loss.status).toBe(
      'idle',
    );
  });
});
