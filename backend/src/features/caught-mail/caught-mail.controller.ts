import { Controller, Get, Param } from '@nestjs/common';
import { caughtMailDtoSchema, caughtMailIdSchema, caughtMailTextDtoSchema } from '@mantlet/common';
import type { CaughtMailDto, CaughtMailTextDto } from '@mantlet/common';
import { z } from 'zod';
import { Public } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { CaughtMailService } from './caught-mail.service.js';

/** There on demonstration and development servers only. */
@Controller('caught-mail')
export class CaughtMailController {
  constructor(private readonly caught: CaughtMailService) {}

  @Get()
  @Public()
  @Returns(z.array(caughtMailDtoSchema), 'Mail that did not leave this demonstration or development server, newest first.')
  list(): Promise<CaughtMailDto[]> {
    return this.caught.list();
  }

  @Get(':mailId')
  @Public()
  @Returns(caughtMailTextDtoSchema, 'One of them, as text.')
  find(@Param('mailId', { schema: caughtMailIdSchema }) mailId: string): Promise<CaughtMailTextDto> {
    return this.caught.find(mailId);
  }
}
