import { Global, Module } from '@nestjs/common';
import { HouseRepository } from './house.repository.js';

@Global()
@Module({ providers: [HouseRepository], exports: [HouseRepository] })
export class HouseModule {}
