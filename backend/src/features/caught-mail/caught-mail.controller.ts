import { Controller, Get, HttpStatus, Param, Req } from '@nestjs/common';
import { caughtMailDtoSchema, caughtMailIdSchema, caughtMailTextDtoSchema, message } from '@mantlet/common';
import type { CaughtMailDto, CaughtMailTextDto } from '@mantlet/common';
import type { Request } from 'express';
import { z } from 'zod';
import { Public } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { Refusal } from '../../shared/refusal.js';
import { MailService } from '../mail/mail.service.js';
import { CaughtMailService } from './caught-mail.service.js';

/** There on demonstration and development servers only. */
@Controller('caught-mail')
export class CaughtMailController {
  constructor(
    private readonly caught: CaughtMailService,
    private readonly mail: MailService,
  ) {}

  @Get()
  @Public()
  @Returns(z.array(caughtMailDtoSchema), 'Mail that did not leave this demonstration or development server, newest first.')
  list(@Req() request: Request): Promise<CaughtMailDto[]> {
    this.requireReader(request);
    return this.caught.list();
  }

  @Get(':mailId')
  @Public()
  @Returns(caughtMailTextDtoSchema, 'One of them, as text.')
  find(@Param('mailId', { schema: caughtMailIdSchema }) mailId: string, @Req() request: Request): Promise<CaughtMailTextDto> {
    this.requireReader(request);
    return this.caught.find(mailId);
  }

  private requireReader(request: Request): void {
    if (!this.mail.isCaughtFor(request)) throw new Refusal(HttpStatus.FORBIDDEN, message('account.mail-elsewhere', {}));
  }
}
