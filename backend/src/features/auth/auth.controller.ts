import { Body, Controller, Delete, Get, HttpCode, Post, Put, Req, Res, UseGuards } from '@nestjs/common';
import { passwordChangeSchema, setUpSchema, signInSchema } from '@mantlet/common';
import type { PasswordChange, SessionDto, SetUp, SignIn } from '@mantlet/common';
import type { Response } from 'express';
import { CurrentActor, Public, SignedIn } from '../../shared/access.js';
import type { Actor, ScopedRequest } from '../../shared/access.js';
import { UsersService } from '../users/users.service.js';
import { LocalAuthGuard } from './local-auth.guard.js';
import { SESSION_COOKIE } from './session.js';
import { SignInThrottlerGuard } from './sign-in-throttler.guard.js';

@Controller()
export class AuthController {
  constructor(private readonly users: UsersService) {}

  /** Who is signed in, if anybody; and whether the installation still waits for its first account. */
  @Get('session')
  @Public()
  async session(@Req() request: ScopedRequest): Promise<SessionDto> {
    return { user: request.user ?? null, needsSetUp: !request.user && (await this.users.isEmpty()) };
  }

  @Post('session')
  @HttpCode(200)
  @Public()
  @UseGuards(SignInThrottlerGuard, LocalAuthGuard)
  signIn(@Body({ schema: signInSchema }) _input: SignIn, @Req() request: ScopedRequest): SessionDto {
    return { user: request.user ?? null, needsSetUp: false };
  }

  @Delete('session')
  @HttpCode(204)
  @SignedIn()
  async signOut(@Req() request: ScopedRequest, @Res({ passthrough: true }) response: Response): Promise<void> {
    await new Promise<void>((done, fail) => request.logout((error: unknown) => (error ? fail(error) : done())));
    await new Promise<void>((done, fail) => request.session.destroy((error: unknown) => (error ? fail(error) : done())));
    response.clearCookie(SESSION_COOKIE);
  }

  @Post('set-up')
  @Public()
  @UseGuards(SignInThrottlerGuard)
  async setUp(@Body({ schema: setUpSchema }) input: SetUp, @Req() request: ScopedRequest): Promise<SessionDto> {
    const user = await this.users.setUp(input);
    await new Promise<void>((done, fail) => request.logIn(user, (error: unknown) => (error ? fail(error) : done())));
    return { user, needsSetUp: false };
  }

  @Put('session/password')
  @HttpCode(204)
  @SignedIn()
  changePassword(@Body({ schema: passwordChangeSchema }) input: PasswordChange, @CurrentActor() actor: Actor, @Req() request: ScopedRequest): Promise<void> {
    return this.users.changePassword(actor, input, request.sessionID);
  }
}
