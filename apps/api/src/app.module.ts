import { Module, type DynamicModule, type Type } from '@nestjs/common';
import { ConfigModule } from './config/config.module.js';
import type { Environment } from './config/environment.js';
import { AlertsModule } from './features/alerts/alerts.module.js';
import { BottlesModule } from './features/bottles/bottles.module.js';
import { ChemistriesModule } from './features/chemistries/chemistries.module.js';
import { DarkroomsModule } from './features/darkrooms/darkrooms.module.js';
import { HoldsModule } from './features/holds/holds.module.js';
import { LoadsModule } from './features/loads/loads.module.js';
import { LogModule } from './features/log/log.module.js';
import { MixesModule } from './features/mixes/mixes.module.js';
import { OrdersModule } from './features/orders/orders.module.js';
import { PeopleModule } from './features/people/people.module.js';
import { ShelfModule } from './features/shelf/shelf.module.js';
import { SignInModule } from './features/sign-in/sign-in.module.js';
import { SuppliersModule } from './features/suppliers/suppliers.module.js';
import { VoidsModule } from './features/voids/voids.module.js';
import { AuthModule } from './platform/auth/auth.module.js';
import { ClockModule } from './platform/clock/clock.module.js';
import { DatabaseModule } from './platform/database/database.module.js';
import { HealthModule } from './platform/health/health.module.js';
import { LoggingModule } from './platform/http/logging.module.js';
import { HouseModule } from './platform/house/house.module.js';
import { JobsModule } from './platform/jobs/jobs.module.js';
import { LedgerModule } from './platform/ledger/ledger.module.js';
import { MailModule } from './platform/mail/mail.module.js';

const platform = [
  ClockModule,
  DatabaseModule,
  AuthModule,
  HouseModule,
  JobsModule,
  MailModule,
  LedgerModule,
  HealthModule,
];
const features = [
  SignInModule,
  DarkroomsModule,
  PeopleModule,
  ChemistriesModule,
  BottlesModule,
  ShelfModule,
  MixesModule,
  LoadsModule,
  HoldsModule,
  VoidsModule,
  SuppliersModule,
  OrdersModule,
  AlertsModule,
  LogModule,
];

@Module({})
export class AppModule {
  /** @param extra modules that a test brings along */
  static with(environment: Environment, extra: readonly Type[] = []): DynamicModule {
    return {
      module: AppModule,
      imports: [
        ConfigModule.with(environment),
        LoggingModule.with(environment),
        ...platform,
        ...features,
        ...extra,
      ],
    };
  }
}
