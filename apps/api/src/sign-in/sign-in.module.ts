import { Module } from '@nestjs/common';
import { DemoAccountsReader } from './demo-accounts.reader.js';
import { IdentityReader } from './identity.reader.js';
import { SessionService } from './session.service.js';
import { SignInController } from './sign-in.controller.js';
import { SignInService } from './sign-in.service.js';
import { SignInThrottle } from './sign-in.throttle.js';

@Module({
  controllers: [SignInController],
  providers: [SignInService, SessionService, SignInThrottle, IdentityReader, DemoAccountsReader],
})
export class SignInModule {}
