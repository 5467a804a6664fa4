import { Module, type DynamicModule } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import type { IncomingMessage } from 'node:http';
import type { Environment } from '../../config/environment.js';
import { describedError } from './described-error.js';

interface LoggedRequest extends Pick<IncomingMessage, 'method' | 'url'> {
  id?: unknown;
  remoteAddress?: string;
}

/** Secrets of 128 bits and more travel in the paths of calendars and unsubscribe links; ids are shorter or have dashes. */
export function withoutSecrets(url: string): string {
  return url.replace(/[A-Za-z0-9_-]{40,}/g, '…').replace(/\?.*/s, '');
}

/** Logs as JSON lines, one a request, without bodies, cookies, headers or secrets. */
@Module({})
export class LoggingModule {
  static with({ logLevel }: Environment): DynamicModule {
    return LoggerModule.forRoot({
      // The line that closes a request says whose it was, too.
      assignResponse: true,
      pinoHttp: {
        level: logLevel,
        redact: ['req.headers', 'res.headers', '*.passphrase', '*.token', '*.secret'],
        serializers: {
          req: ({ id, method, url, remoteAddress }: LoggedRequest) => ({
            id,
            method,
            url: withoutSecrets(url ?? ''),
            remoteAddress,
          }),
          err: (error: { raw?: unknown }) => describedError(error.raw ?? error),
          res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
        },
      },
    });
  }
}
