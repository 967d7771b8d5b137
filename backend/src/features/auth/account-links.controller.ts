import { Body, Controller, HttpCode, Post, Req, UseGuards } from '@nestjs/common';
import { accountLinkDtoSchema, accountLinkSchema, accountLinkUseSchema, resetRequestSchema, sessionDtoSchema } from '@mantlet/common';
import type { AccountLink, AccountLinkDto, AccountLinkUse, ResetRequest, SessionDto } from '@mantlet/common';
import { Public } from '../../shared/access.js';
import type { ScopedRequest } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { MailService } from '../mail/mail.service.js';
import { AccountLinksService } from '../users/account-links.service.js';
import { AccountThrottlerGuard } from './account-throttler.guard.js';
import { openSession } from './open-session.js';

/** What the mailed links open. Tokens travel in bodies, so that no log of addresses holds one. */
@Controller()
@UseGuards(AccountThrottlerGuard)
export class AccountLinksController {
  constructor(
    private readonly links: AccountLinksService,
    private readonly mail: MailService,
  ) {}

  @Post('password-resets')
  @HttpCode(202)
  @Public()
  @ReturnsNothing('Mails a link for another password, if there is such an account: the answer, and the time it takes, is the same for every address.')
  askForReset(@Body({ schema: resetRequestSchema }) input: ResetRequest): void {
    this.links.askForReset(input.email);
  }

  @Post('account-links/look-up')
  @HttpCode(200)
  @Public()
  @Returns(accountLinkDtoSchema, 'Whose link it is, told to whoever holds it.')
  lookUp(@Body({ schema: accountLinkSchema }) input: AccountLink): Promise<AccountLinkDto> {
    return this.links.lookUp(input);
  }

  @Post('account-links/use')
  @HttpCode(200)
  @Public()
  @Returns(sessionDtoSchema, 'Sets the password, ends every other session of the person and signs them in here.')
  async use(@Body({ schema: accountLinkUseSchema }) input: AccountLinkUse, @Req() request: ScopedRequest): Promise<SessionDto> {
    const proved = await this.links.use(input);
    await openSession(request, proved);
    return { user: proved.actor, needsSetUp: false, caughtMail: this.mail.isCaughtFor(request) };
  }
}
