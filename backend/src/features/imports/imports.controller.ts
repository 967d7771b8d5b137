import { Body, Controller, Delete, Get, HttpCode, HttpStatus, Param, Post, Put, Query, UploadedFile, UseInterceptors } from '@nestjs/common';
import { importConfirmSchema, importMappingSchema, importPreviewQuerySchema, message } from '@mantlet/common';
import type { ImportConfirm, ImportDto, ImportMapping, ImportPreviewDto, ImportResultDto } from '@mantlet/common';
import { Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { unprocessable } from '../../shared/refusal.js';
import { uploadedName } from '../../shared/uploaded-name.js';
import { idParam } from '../../shared/validation.js';
import { ImportConfirmService } from './import-confirm.service.js';
import { ImportsService } from './imports.service.js';
import type { PreviewQuery } from './imports.service.js';
import { ScheduleFileInterceptor } from './schedule-file.interceptor.js';

/** Member schedules as CSV or XLSX: upload, say what the columns hold, look at every row, confirm. */
@Controller('projects/:projectId/imports')
export class ImportsController {
  constructor(
    private readonly imports: ImportsService,
    private readonly confirming: ImportConfirmService,
  ) {}

  /** multipart, field `file`, at most 10 MB. */
  @Post()
  @Roles('specifier')
  @UseInterceptors(ScheduleFileInterceptor)
  upload(@Scope() scope: ProjectScope, @UploadedFile() file: Express.Multer.File | undefined): Promise<ImportDto> {
    if (!file) throw unprocessable(message('import.no-file', {}));
    return this.imports.upload(scope, uploadedName(file, 'The file'), file.buffer);
  }

  @Get(':importId')
  @Roles('specifier')
  find(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string): Promise<ImportDto> {
    return this.imports.find(scope, importId);
  }

  @Put(':importId/mapping')
  @Roles('specifier')
  map(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Body({ schema: importMappingSchema }) mapping: ImportMapping): Promise<ImportPreviewDto> {
    return this.imports.map(scope, importId, mapping);
  }

  @Get(':importId/preview')
  @Roles('specifier')
  preview(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Query({ schema: importPreviewQuerySchema }) query: PreviewQuery): Promise<ImportPreviewDto> {
    return this.imports.preview(scope, importId, query);
  }

  @Post(':importId/confirm')
  @HttpCode(HttpStatus.OK)
  @Roles('specifier')
  confirm(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string, @Body({ schema: importConfirmSchema }) input: ImportConfirm): Promise<ImportResultDto> {
    return this.confirming.confirm(scope, importId, input);
  }

  /** Gives it up; nothing was written, nothing will be. */
  @Delete(':importId')
  @HttpCode(HttpStatus.NO_CONTENT)
  @Roles('specifier')
  abandon(@Scope() scope: ProjectScope, @Param('importId', idParam) importId: string): Promise<void> {
    return this.imports.abandon(scope, importId);
  }
}
