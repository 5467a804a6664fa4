import { problemTable } from './problem-table.js';
import { invalid, problem } from './problem.js';

describe('problems', () => {
  it.each(Object.entries(problemTable))(
    '%s has a status of a failure and a title that is a phrase',
    (code, { status, title }) => {
      expect(status).toBeGreaterThanOrEqual(400);
      expect(status).toBeLessThan(600);
      expect(code).toMatch(/^[a-z]+(-[a-z]+)*$/);
      expect(title).toMatch(/^[A-Z].*[^.!]$/);
    },
  );

  it('become documents with their code, their sentence and what was added', () => {
    expect(problem('too-many', 8).with({ since: 'noon' }).toDocument()).toEqual({
      type: 'urn:wetside:problem:too-many',
      title: 'Too many tries',
      status: 429,
      detail: 'Wait 8 seconds and try again.',
      code: 'too-many',
      since: 'noon',
    });
  });

  it('name the fields that were wrong', () => {
    const errors = [{ field: 'film.0.count', message: 'Give a whole number from 1 to 99.' }];
    expect(invalid(errors).toDocument()).toMatchObject({ status: 400, code: 'invalid', errors });
  });

  it('keep their headers when something is added', () => {
    expect(problem('too-many', 1).withHeaders({ 'retry-after': '1' }).with({ a: 1 }).headers).toEqual({
      'retry-after': '1',
    });
  });
});
