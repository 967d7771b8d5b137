import { Global, Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { MAIL_OPTIONS } from './mail-options.js';
import type { MailOptions } from './mail-options.js';
import { Mail } from './mail.entity.js';
import { MailService } from './mail.service.js';

@Global()
@Module({})
export class MailModule {
  static forRoot(options: MailOptions): DynamicModule {
    return {
      module: MailModule,
      imports: [TypeOrmModule.forFeature([Mail])],
      providers: [MailService, { provide: MAIL_OPTIONS, useValue: options }],
      exports: [MailService],
    };
  }
}
