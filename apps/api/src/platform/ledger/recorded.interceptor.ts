import { Injectable, type CallHandler, type ExecutionContext, type NestInterceptor } from '@nestjs/common';
import type { Response } from 'express';
import { map, type Observable } from 'rxjs';
import { Recorded } from './action-recorder.js';

/** 201 for an action recorded now, 200 for one that had been recorded before; the body is the same. */
@Injectable()
export class RecordedInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler<unknown>): Observable<unknown> {
    return next.handle().pipe(
      map((answer) => {
        if (!(answer instanceof Recorded)) return answer;
        context
          .switchToHttp()
          .getResponse<Response>()
          .status(answer.created ? 201 : 200);
        return answer.body as unknown;
      }),
    );
  }
}
