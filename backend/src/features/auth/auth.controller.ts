import { Body, Controller, Delete, Get, HttpCode, Post, Put, Req, Res, UseGuards } from '@nestjs/common';
import { passwordChangeSchema, sessionDtoSchema, setUpSchema, signInSchema } from '@mantlet/common';
import type { PasswordChange, SessionDto, SetUp, SignIn } from '@mantlet/common';
import type { Response } from 'express';
import { CurrentActor, Public, SignedIn } from '../../shared/access.js';
import type { Actor, ScopedRequest } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { MailService } from '../mail/mail.service.js';
import { UsersService } from '../users/users.service.js';
import { AccountThrottlerGuard } from './account-throttler.guard.js';
import { LocalAuthGuard } from './local-auth.guard.js';
import { openSession } from './open-session.js';
import { SESSION_COOKIE } from './session.js';

@Controller()
export class AuthController {
  constructor(
    private readonly users: UsersService,
    private readonly mail: MailService,
  ) {}

  /** Who is signed in, if anybody; and whether the installation still waits for its first account. */
  @Get('session')
  @Public()
  @Returns(sessionDtoSchema, 'Who is signed in, if anybody; and whether the installation still waits for its first account.')
  async session(@Req() request: ScopedRequest): Promise<SessionDto> {
    return this.answer(request, request.user ?? null, !request.user && (await this.users.isEmpty()));
  }

  @Post('session')
  @HttpCode(200)
  @Public()
  @Returns(sessionDtoSchema, 'Signs in and sets the session cookie.')
  @UseGuards(AccountThrottlerGuard, LocalAuthGuard)
  signIn(@Body({ schema: signInSchema }) _input: SignIn, @Req() request: ScopedRequest): SessionDto {
    return this.answer(request, request.user ?? null);
  }

  @Delete('session')
  @HttpCode(204)
  @SignedIn()
  @ReturnsNothing('Signs out.')
  async signOut(@Req() request: ScopedRequest, @Res({ passthrough: true }) response: Response): Promise<void> {
    await new Promise<void>((done, fail) => request.logout((error: unknown) => (error ? fail(error) : done())));
    await new Promise<void>((done, fail) => request.session.destroy((error: unknown) => (error ? fail(error) : done())));
    response.clearCookie(SESSION_COOKIE);
  }

  @Post('set-up')
  @Public()
  @Returns(sessionDtoSchema, 'Makes the first account of an empty installation, the administrator, and signs in.')
  @UseGuards(AccountThrottlerGuard)
  async setUp(@Body({ schema: setUpSchema }) input: SetUp, @Req() request: ScopedRequest): Promise<SessionDto> {
    const proved = await this.users.setUp(input);
    await openSession(request, proved);
    return this.answer(request, proved.actor);
  }

  @Put('session/password')
  @HttpCode(204)
  @SignedIn()
  @ReturnsNothing('Changes the password of the caller; their other sessions end.')
  @UseGuards(AccountThrottlerGuard)
  changePassword(@Body({ schema: passwordChangeSchema }) input: PasswordChange, @CurrentActor() actor: Actor, @Req() request: ScopedRequest): Promise<void> {
    return this.users.changePassword(actor, input, request.sessionID);
  }

  private answer(request: ScopedRequest, user: Actor | null, needsSetUp = false): SessionDto {
    return { user, needsSetUp, caughtMail: this.mail.isCaughtFor(request) };
  }
}
