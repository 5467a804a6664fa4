import { Module, type DynamicModule } from '@nestjs/common';
import { Environment } from './environment.js';

@Module({})
export class ConfigModule {
  static with(environment: Environment): DynamicModule {
    return {
      module: ConfigModule,
      global: true,
      providers: [{ provide: Environment, useValue: environment }],
      exports: [Environment],
    };
  }
}
