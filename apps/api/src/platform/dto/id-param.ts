import { Injectable, Param, type PipeTransform } from '@nestjs/common';
import { problem } from '../errors/problem.js';
import { ANY_UUID } from './text-checks.js';

const uuid = new RegExp(ANY_UUID, 'u');

/** What is no id names nothing: the same 404 as an id that is not there. */
@Injectable()
export class IdOrNotFound implements PipeTransform<string, string> {
  transform(value: string): string {
    if (!uuid.test(value)) throw problem('not-found');
    return value.toLowerCase();
  }
}

/** An id out of the path: `@IdParam('bottleId') bottleId: string`. Its name ends in Id, as the OpenAPI document has it. */
export const IdParam = (name: string): ParameterDecorator => Param(name, IdOrNotFound);
