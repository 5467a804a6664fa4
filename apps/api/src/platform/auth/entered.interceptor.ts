import { Injectable, type CallHandler, type ExecutionContext, type NestInterceptor } from '@nestjs/common';
import { tap, type Observable } from 'rxjs';
import type { AuthedRequest } from './caller.js';

/** Holds back the answer of a darkroom's route that never asked whether the caller belongs there. */
@Injectable()
export class EnteredInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const { caller } = context.switchToHttp().getRequest<AuthedRequest>();
    return next.handle().pipe(
      tap(() => {
        if (caller && caller.least !== null && !caller.entered) {
          throw new Error(
            `${context.getClass().name}.${context.getHandler().name} answers without entering the darkroom.`,
          );
        }
      }),
    );
  }
}
