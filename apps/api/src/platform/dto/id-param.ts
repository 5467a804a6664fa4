import { Injectable, Param, type PipeTransform } from '@nestjs/common';
import { validate } from 'uuid';
import { problem } from '../errors/problem.js';

/** What is no id names nothing: the same 404 as an id that is not there. */
@Injectable()
class IdOrNotFound implements PipeTransform<string, string> {
  transform(value: string): string {
    if (!validate(value)) throw problem('not-found');
    return value.toLowerCase();
  }
}

/** An id out of the path: `@IdParam('bottleId') bottleId: string`. */
export const IdParam = (name: string): ParameterDecorator => Param(name, IdOrNotFound);
