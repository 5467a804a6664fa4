import { Global, Module } from '@nestjs/common';
import { APP_GUARD, APP_INTERCEPTOR, DiscoveryModule } from '@nestjs/core';
import { Accounts } from './accounts.js';
import { AddressesRepository } from './addresses.repository.js';
import { AuthGuard } from './auth.guard.js';
import { Cookies } from './cookies.js';
import { CrossSiteGuard } from './cross-site.guard.js';
import { DarkroomAccess } from './darkroom-access.js';
import { EnteredInterceptor } from './entered.interceptor.js';
import { Passphrases } from './passphrases.js';
import { Sessions } from './sessions.js';
import { SessionsRepository } from './sessions.repository.js';
import { Throttle } from './throttle.js';
import { Tokens } from './tokens.js';

@Global()
@Module({
  imports: [DiscoveryModule],
  providers: [
    Cookies,
    Tokens,
    Passphrases,
    Accounts,
    AddressesRepository,
    Throttle,
    SessionsRepository,
    Sessions,
    DarkroomAccess,
    // In this order: where a request comes from is asked before who sent it.
    { provide: APP_GUARD, useClass: CrossSiteGuard },
    { provide: APP_GUARD, useClass: AuthGuard },
    { provide: APP_INTERCEPTOR, useClass: EnteredInterceptor },
  ],
  exports: [
    Accounts,
    AddressesRepository,
    Cookies,
    Tokens,
    Passphrases,
    Throttle,
    SessionsRepository,
    Sessions,
    DarkroomAccess,
  ],
})
export class AuthModule {}
