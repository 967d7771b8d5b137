import { Controller, Get, Query, StreamableFile } from '@nestjs/common';
import { quantitiesDtoSchema, quantityQuerySchema } from '@mantlet/common';
import type { QuantitiesDto, QuantityQuery } from '@mantlet/common';
import { DesignTeam, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsFile } from '../../shared/openapi/returns.js';
import { QuantitiesService } from './quantities.service.js';

@Controller('projects/:projectId')
export class QuantitiesController {
  constructor(private readonly quantities: QuantitiesService) {}

  /** Printed lines of protection, split by two keys, and what to buy. */
  @Get('quantities')
  @DesignTeam()
  @Returns(quantitiesDtoSchema, 'Printed lines of protection split by two keys, and what to buy; m², m³, litres, kg and money as decimal strings.')
  split(@Scope() scope: ProjectScope, @Query({ schema: quantityQuerySchema }) query: QuantityQuery): Promise<QuantitiesDto> {
    return this.quantities.split(scope.projectId, query);
  }

  @Get('quantities/lines.csv')
  @DesignTeam()
  @ReturnsFile('text/csv', 'The printed lines as CSV.')
  async linesCsv(@Scope() scope: ProjectScope): Promise<StreamableFile> {
    const content = Buffer.from(await this.quantities.linesCsv(scope.projectId));
    return new StreamableFile(content, { type: 'text/csv; charset=utf-8', disposition: 'attachment; filename="quantities.csv"', length: content.length });
  }

  @Get('quantities.xlsx')
  @DesignTeam()
  @ReturnsFile('application/vnd.openxmlformats-officedocument.spreadsheetml.sheet', 'The quantities as a workbook.')
  async workbook(@Scope() scope: ProjectScope, @Query({ schema: quantityQuerySchema }) query: QuantityQuery): Promise<StreamableFile> {
    const { name, content } = await this.quantities.workbook(scope.projectId, query);
    return new StreamableFile(content, { type: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet', disposition: `attachment; filename="${name}"`, length: content.length });
  }
}
