import { Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { CaughtMailController } from './caught-mail.controller.js';
import { CAUGHT_MAIL_DIR, CaughtMailService } from './caught-mail.service.js';

/** Taken in only where mail is caught: whoever reads it could follow anybody's links. */
@Module({})
export class CaughtMailModule {
  static forFolder(folder: string): DynamicModule {
    return { module: CaughtMailModule, controllers: [CaughtMailController], providers: [CaughtMailService, { provide: CAUGHT_MAIL_DIR, useValue: folder }] };
  }
}
