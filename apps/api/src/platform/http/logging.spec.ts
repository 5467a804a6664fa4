import { describedError } from './described-error.js';
import { withoutSecrets } from './logging.module.js';

describe('the log', () => {
  it('keeps an error’s chain and place, and not the values of a failed query', () => {
    const cause = Object.assign(new Error('deadlock detected'), { code: '40P01' });
    const error = new Error('Failed query: select $1\nparams: ada@darkroom.example,a1b2', { cause });
    const [first, second] = describedError(error);
    expect(first).toMatchObject({ name: 'Error', message: 'Failed query: select $1' });
    expect(first?.at[0]).toContain('logging.spec');
    expect(second).toMatchObject({ message: 'deadlock detected', code: '40P01' });
    expect(JSON.stringify(describedError(error))).not.toContain('ada@');
    expect(describedError('spilt')).toEqual([{ name: 'string', message: 'spilt', at: [] }]);
  });

  it('keeps ids in addresses, and no secrets or queries', () => {
    const id = '0190c8a0-0000-7000-8000-000000000001';
    expect(withoutSecrets(`/api/darkrooms/${id}/bottles?search=ada`)).toBe(`/api/darkrooms/${id}/bottles`);
    expect(withoutSecrets(`/api/unsubscribe/${'aB3_'.repeat(11)}`)).toBe('/api/unsubscribe/…');
  });
});
