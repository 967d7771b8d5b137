import { Module } from '@nestjs/common';
import type { DynamicModule } from '@nestjs/common';
import { TypeOrmModule } from '@nestjs/typeorm';
import { dataSourceOptions } from './database/data-source-options.js';
import { AssessmentModule } from './features/assessment/assessment.module.js';
import { AuditModule } from './features/audit/audit.module.js';
import { AuthModule } from './features/auth/auth.module.js';
import { EventsModule } from './features/events/events.module.js';
import { JobsModule } from './features/jobs/jobs.module.js';
import { CaughtMailModule } from './features/caught-mail/caught-mail.module.js';
import { noMail } from './features/mail/mail-options.js';
import type { MailOptions } from './features/mail/mail-options.js';
import { MailModule } from './features/mail/mail.module.js';
import { MembersModule } from './features/members/members.module.js';
import { ImportsModule } from './features/imports/imports.module.js';
import { QuantitiesModule } from './features/quantities/quantities.module.js';
import { SectionsModule } from './features/sections/sections.module.js';
import { LevelsModule } from './features/levels/levels.module.js';
import { ProjectsModule } from './features/projects/projects.module.js';
import { ZonesModule } from './features/zones/zones.module.js';
import { ProductsModule } from './features/products/products.module.js';
import { RevisionsModule } from './features/revisions/revisions.module.js';
import { SiteModule } from './features/site/site.module.js';
import { UsersModule } from './features/users/users.module.js';

/** The features of the server, one module each. */
export const featureModules = [AuditModule, UsersModule, AuthModule, SectionsModule, AssessmentModule, QuantitiesModule, LevelsModule, ProjectsModule, ZonesModule, ProductsModule, MembersModule, ImportsModule, RevisionsModule, SiteModule, EventsModule, JobsModule];

export interface AppModuleOptions {
  mail?: MailOptions | undefined;
  /** where a local fake writes mail; anybody can read it here then */
  caughtMailDir?: string | undefined;
}

@Module({})
export class AppModule {
  static forDatabase(url: string, { mail = noMail, caughtMailDir }: AppModuleOptions = {}): DynamicModule {
    const caught = caughtMailDir ? [CaughtMailModule.forFolder(caughtMailDir)] : [];
    return { module: AppModule, imports: [TypeOrmModule.forRoot(dataSourceOptions(url)), MailModule.forRoot(mail), ...featureModules, ...caught] };
  }
}
