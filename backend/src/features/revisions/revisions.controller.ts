import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query, Res, StreamableFile } from '@nestjs/common';
import {
  readinessDtoSchema, returnInputSchema, revisionDetailDtoSchema, revisionDtoSchema, revisionInputSchema, revisionUpdateSchema, revisionVerificationDtoSchema,
} from '@mantlet/common';
import type { ReadinessDto, ReturnInput, RevisionDetailDto, RevisionDto, RevisionInput, RevisionUpdate, RevisionVerificationDto } from '@mantlet/common';
import type { Response } from 'express';
import { z } from 'zod';
import { AnyRole, DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsFile } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { RevisionsService } from './revisions.service.js';

const pdfQuery = z.object({ download: z.enum(['0', '1']).default('0') });

@Controller('projects/:projectId')
export class RevisionsController {
  constructor(private readonly revisions: RevisionsService) {}

  /** What keeps the schedule from being prepared, and what deserves a look. */
  @Get('readiness')
  @DesignTeam()
  @Returns(readinessDtoSchema, 'What keeps the schedule from being prepared, and what deserves a look.')
  readiness(@Scope() scope: ProjectScope): Promise<ReadinessDto> {
    return this.revisions.readiness(scope.projectId);
  }

  @Get('revisions')
  @AnyRole()
  @Returns(z.array(revisionDtoSchema), 'Revisions, newest first; those without a design role see issued and superseded ones only.')
  list(@Scope() scope: ProjectScope): Promise<RevisionDto[]> {
    return this.revisions.list(scope);
  }

  @Post('revisions')
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Starts the next revision.')
  create(@Scope() scope: ProjectScope, @Body({ schema: revisionInputSchema }) input: RevisionInput): Promise<RevisionDto> {
    return this.revisions.create(scope, input);
  }

  @Get('revisions/:revisionId')
  @AnyRole()
  @Returns(revisionDetailDtoSchema, 'A revision and what its frozen record holds, in short.')
  detail(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string): Promise<RevisionDetailDto> {
    return this.revisions.detail(scope, id);
  }

  @Patch('revisions/:revisionId')
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Changes code and purpose of a draft.')
  update(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string, @Body({ schema: revisionUpdateSchema }) input: RevisionUpdate): Promise<RevisionDto> {
    return this.revisions.update(scope, id, input);
  }

  @Post('revisions/:revisionId/prepare')
  @HttpCode(200)
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Freezes the schedule as it stands.')
  prepare(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string): Promise<RevisionDto> {
    return this.revisions.prepare(scope, id);
  }

  @Post('revisions/:revisionId/check')
  @HttpCode(200)
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Signs as the checker: somebody other than who prepared it.')
  check(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string): Promise<RevisionDto> {
    return this.revisions.check(scope, id);
  }

  @Post('revisions/:revisionId/return')
  @HttpCode(200)
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Returns a revision to draft, saying what must change.')
  giveBack(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string, @Body({ schema: returnInputSchema }) input: ReturnInput): Promise<RevisionDto> {
    return this.revisions.giveBack(scope, id, input);
  }

  @Post('revisions/:revisionId/issue')
  @HttpCode(200)
  @Roles('specifier')
  @Returns(revisionDtoSchema, 'Issues a checked revision: its PDF is made once and never changes.')
  issue(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string): Promise<RevisionDto> {
    return this.revisions.issue(scope, id);
  }

  /** The PDF, to look at or (?download=1) to keep. Its SHA-256 is the ETag and X-Content-SHA256. */
  @Get('revisions/:revisionId/pdf')
  @AnyRole()
  @ReturnsFile('application/pdf', 'The PDF, to look at or (download=1) to keep; its SHA-256 is the ETag and X-Content-SHA256.')
  async pdf(
    @Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string, @Query({ schema: pdfQuery }) query: z.infer<typeof pdfQuery>,
    @Res({ passthrough: true }) response: Response,
  ): Promise<StreamableFile> {
    const { content, fileName, sha256 } = await this.revisions.pdf(scope, id);
    response.set({ ETag: `"${sha256}"`, 'X-Content-SHA256': sha256, 'Cache-Control': 'private, no-cache' });
    const disposition = `${query.download === '1' ? 'attachment' : 'inline'}; filename="${fileName}"`;
    return new StreamableFile(content, { type: 'application/pdf', disposition, length: content.length });
  }

  @Get('revisions/:revisionId/verify')
  @AnyRole()
  @Returns(revisionVerificationDtoSchema, 'Compares the stored PDF and record with the digests taken when they were made.')
  verify(@Scope() scope: ProjectScope, @Param('revisionId', idParam) id: string): Promise<RevisionVerificationDto> {
    return this.revisions.verify(scope, id);
  }
}
