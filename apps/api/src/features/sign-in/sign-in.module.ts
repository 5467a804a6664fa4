import { Module } from '@nestjs/common';
import { SignInController } from './sign-in.controller.js';
import { SignInRepository } from './sign-in.repository.js';
import { SignInService } from './sign-in.service.js';

@Module({ controllers: [SignInController], providers: [SignInService, SignInRepository] })
export class SignInModule {}
