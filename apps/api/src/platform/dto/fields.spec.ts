import 'reflect-metadata';
import { ValidationPipe } from '@nestjs/common';
import { Problem } from '../errors/problem.js';
import { validationProblem } from '../errors/validation-problem.js';
import {
  Choice,
  Flag,
  Id,
  Instant,
  ListOf,
  ListOfIds,
  LocalDateField,
  MailAddress,
  Nested,
  OpenObject,
  Text,
  WholeNumber,
} from './fields.js';

class Film {
  @WholeNumber({ min: 1, max: 99 })
  count: number;
}

class Everything {
  @Text({ max: 5 })
  text: string;
  @WholeNumber({ min: 0, max: 10, nullable: true })
  number: number | null;
  @Id({ optional: true })
  id?: string;
  @Instant()
  at: string;
  @LocalDateField()
  on: string;
  @Choice(['mL', 'fl oz'])
  unit: string;
  @Choice([1])
  v: number;
  @ListOf(() => Film, { min: 1, max: 2 })
  film: Film[];
  @ListOfIds({ max: 2 })
  ids: string[];
  @Nested(() => Film, { optional: true })
  first?: Film;
  @Flag()
  yes: boolean;
  @MailAddress()
  email: string;
  @OpenObject()
  open: object;
}

const ID = '0190c8a0-0000-7000-8000-000000000001';
const right = () => ({
  text: ' five ',
  number: null,
  at: '2025-03-01T18:20:00Z',
  on: '2024-02-29',
  unit: 'mL',
  v: 1,
  film: [{ count: 1 }],
  ids: [ID],
  yes: false,
  email: ' Ada@Example.ORG ',
  open: { any: ['thing'] },
});

const pipe = new ValidationPipe({
  whitelist: true,
  forbidNonWhitelisted: true,
  transform: true,
  exceptionFactory: validationProblem,
});
const parse = (body: unknown): Promise<unknown> =>
  pipe.transform(body, { type: 'body', metatype: Everything });

async function fieldsRefused(body: unknown): Promise<unknown> {
  const thrown: unknown = await parse(body).catch((error: unknown) => error);
  if (!(thrown instanceof Problem)) throw new Error('It was taken.');
  return thrown.toDocument().errors?.map(({ field }) => field);
}

describe('fields', () => {
  it('take what is right, trimmed and in its class', async () => {
    expect(await parse(right())).toEqual(
      Object.assign(new Everything(), right(), { text: 'five', email: 'ada@example.org' }),
    );
  });

  it.each([
    [{ text: '   ' }, 'text'],
    [{ text: 'sixsix' }, 'text'],
    [{ text: 7 }, 'text'],
    [{ number: 1.5 }, 'number'],
    [{ number: '5' }, 'number'],
    [{ number: undefined }, 'number'],
    [{ id: 'x' }, 'id'],
    [{ id: null }, 'id'],
    [{ at: '2025-03-01T18:20:00' }, 'at'],
    [{ at: '2025-02-30T18:20:00Z' }, 'at'],
    [{ on: '2025-02-29' }, 'on'],
    [{ unit: 'pint' }, 'unit'],
    [{ v: '1' }, 'v'],
    [{ film: [] }, 'film'],
    [{ film: [{ count: 0 }] }, 'film.0.count'],
    [{ film: [{ count: 1, colour: 'red' }] }, 'film.0.colour'],
    [{ ids: ['x'] }, 'ids'],
    [{ first: { count: 100 } }, 'first.count'],
    [{ yes: 'true' }, 'yes'],
    [{ email: 'ada' }, 'email'],
    [{ open: 'shut' }, 'open'],
    [{ role: 'manager' }, 'role'],
  ])('refuse %j and name the field', async (change, field) => {
    expect(await fieldsRefused({ ...right(), ...change })).toEqual([field]);
  });
});
