import { draftComplaints } from './draft-rules.js';

const sold = new Map([
  ['fixer', { supplierId: 'here' }],
  ['stop', { supplierId: 'here' }],
  ['other', { supplierId: 'elsewhere' }],
]);
const line = (id: string, supplierPackId: string) => ({ id, supplierPackId, count: 1 });

it('takes lines that the supplier sells, one for each pack', () => {
  expect(draftComplaints([line('1', 'fixer'), line('2', 'stop')], sold, 'here')).toEqual([]);
});

it('names the line that another supplier sells, or nobody', () => {
  expect(
    draftComplaints([line('1', 'fixer'), line('2', 'other'), line('3', 'nowhere')], sold, 'here'),
  ).toEqual([
    { field: 'lines.1.supplierPackId', message: 'This supplier does not sell that.' },
    { field: 'lines.2.supplierPackId', message: 'This supplier does not sell that.' },
  ]);
});

it('names a pack that stands on two lines, and a line that is named twice', () => {
  expect(draftComplaints([line('1', 'fixer'), line('2', 'fixer'), line('1', 'stop')], sold, 'here')).toEqual([
    { field: 'lines.1.supplierPackId', message: 'This pack stands on a line above already.' },
    { field: 'lines.2.id', message: 'This line is named twice.' },
  ]);
});
