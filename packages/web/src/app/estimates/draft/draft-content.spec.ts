import { buildLine, buildRevisionContent, buildRoom } from '@bookmatch/common/testing/build-estimate';
import { contentSoFar, readDraft } from './draft-content';
import { draftForm, type DraftFields } from './draft-form';

const fieldsOf = (content = buildRevisionContent()): DraftFields => draftForm(content).getRawValue();
const blank = (fields: DraftFields): DraftFields['rooms'][number]['lines'][number] => ({
  ...fields.rooms[0]!.lines[0]!,
  id: crypto.randomUUID(),
  description: '',
  unitCostCents: null,
  unitPriceCents: null,
});

describe('what is typed into a draft', () => {
  it('comes back as it was filled in', () => {
    const content = buildRevisionContent({ discountCents: 500 });
    expect(readDraft(fieldsOf(content))).toEqual({ content });
  });

  it('leaves out a line nobody has begun to write', () => {
    const fields = fieldsOf();
    fields.rooms[0]!.lines.unshift(blank(fields));
    const read = readDraft(fields);
    expect('content' in read && read.content.rooms[0]!.lines).toHaveLength(1);
  });

  it('names a wrong field at its place on the form, past lines that are left out', () => {
    const fields = fieldsOf();
    const [line] = fields.rooms[0]!.lines;
    fields.rooms[0]!.lines = [blank(fields), { ...line!, quantity: 'x' }];
    expect(readDraft(fields)).toEqual({
      problems: [{ path: 'rooms.0.lines.1.quantity', message: expect.stringContaining('number') }],
    });
  });

  it('says one sentence a field, and nothing of a whole whose part is wrong', () => {
    const fields = fieldsOf();
    fields.rooms[0]!.lines[0]!.quantity = '-';
    fields.billingSchedule[0]!.name = '';
    const read = readDraft(fields);
    const paths = 'problems' in read ? read.problems.map(({ path }) => path) : [];
    expect(paths).toEqual(['rooms.0.lines.0.quantity', 'billingSchedule.0.name']);
  });

  it('takes an empty amount as nothing, and hours only with an operation', () => {
    const fields = fieldsOf();
    Object.assign(fields.rooms[0]!.lines[0]!, {
      unitCostCents: null,
      operationId: null,
      plannedMinutesPerUnit: '90',
    });
    const read = readDraft(fields);
    expect('content' in read && read.content.rooms[0]!.lines[0]).toMatchObject({
      unitCostCents: 0,
      plannedMinutesPerUnit: null,
    });
  });

  it('counts nothing for what cannot be read yet, so that figures follow the typing', () => {
    const line = buildLine({ quantity: '2' });
    const fields = fieldsOf(buildRevisionContent({ rooms: [buildRoom({ lines: [line, buildLine()] })] }));
    fields.rooms[0]!.lines[0]!.quantity = '2.';
    fields.taxRate = '';
    const content = contentSoFar(fields);
    expect(content.rooms[0]!.lines.map(({ quantity }) => quantity)).toEqual(['0', '3']);
    expect(content.taxRate).toBe('0');
  });
});
