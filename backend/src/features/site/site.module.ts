import { Module } from '@nestjs/common';
import { RevisionsModule } from '../revisions/revisions.module.js';
import { SiteController } from './site.controller.js';
import { SiteService } from './site.service.js';

@Module({ imports: [RevisionsModule], controllers: [SiteController], providers: [SiteService] })
export class SiteModule {}
