import { Body, Controller, Delete, Get, HttpCode, HttpStatus, Param, Patch, Post, Put, Query } from '@nestjs/common';
import {
  acceptanceSchema, acceptancesWithdrawnDtoSchema, acceptanceWithdrawalSchema, bulkMemberSchema, bulkStructuralSchema, foundRequestSchema, foundSummaryDtoSchema,
  memberChoiceSchema, memberDeleteQuerySchema, memberDtoSchema, memberInputSchema, memberNeighboursDtoSchema, memberPageDtoSchema, memberQuerySchema, membersAcceptedDtoSchema,
  membersChangedDtoSchema, membersDeletedDtoSchema, memberSheetDtoSchema, memberStructuralSchema, memberUpdateSchema, memberValuesDtoSchema, previewAnswerDtoSchema,
} from '@mantlet/common';
import type {
  Acceptance, AcceptanceWithdrawal, MembersChangedDto, BulkMember, BulkStructural, FoundRequest, FoundSummaryDto, MemberChoice, MemberDto, MemberInput, MemberNeighboursDto, MemberPageDto,
  MemberQuery, MemberSheetDto, MemberStructural, MemberUpdate, MemberValuesDto, PreviewAnswerDto,
} from '@mantlet/common';
import { DesignTeam, Roles, Scope } from '../../shared/access.js';
import type { ProjectScope } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { AcceptancesService } from './acceptances.service.js';
import { MemberChoiceService } from './member-choice.service.js';
import { MemberListService } from './member-list.service.js';
import { MemberSheetService } from './member-sheet.service.js';
import { MembersBulkService } from './members-bulk.service.js';
import { MembersService } from './members.service.js';

/** Members of a project. What the specifier and the structural engineer decide are separate routes with separate fields. */
@Controller('projects/:projectId/members')
export class MembersController {
  constructor(
    private readonly members: MembersService,
    private readonly lists: MemberListService,
    private readonly sheets: MemberSheetService,
    private readonly bulk: MembersBulkService,
    private readonly choice: MemberChoiceService,
  ) {}

  @Get()
  @DesignTeam()
  @Returns(memberPageDtoSchema, 'Members, filtered, sorted and paged; A/V in 1/m, temperatures in °C, lengths in mm, thickness in its unit.')
  list(@Scope() scope: ProjectScope, @Query({ schema: memberQuerySchema }) query: MemberQuery): Promise<MemberPageDto> {
    return this.lists.list(scope.projectId, query);
  }

  /** What a filter may choose from. */
  @Get('values')
  @DesignTeam()
  @Returns(memberValuesDtoSchema, 'The values that members of the project have, each with how many have it.')
  values(@Scope() scope: ProjectScope): Promise<MemberValuesDto> {
    return this.lists.values(scope.projectId);
  }

  /** Writes nothing: what a filter finds, before something is done with all of it. */
  @Post('found')
  @HttpCode(HttpStatus.OK)
  @DesignTeam()
  @Returns(foundSummaryDtoSchema, 'What a filter finds: how many members, under which stamp, and what of them may be accepted.')
  found(@Scope() scope: ProjectScope, @Body({ schema: foundRequestSchema }) query: FoundRequest): Promise<FoundSummaryDto> {
    return this.choice.summary(scope.projectId, query);
  }

  /** To go from sheet to sheet in the order of the list that was left. */
  @Get(':memberId/neighbours')
  @DesignTeam()
  @Returns(memberNeighboursDtoSchema, 'The members before and after it in the list as the query filters and sorts it.')
  neighbours(@Scope() scope: ProjectScope, @Param('memberId', idParam) memberId: string, @Query({ schema: memberQuerySchema }) query: MemberQuery): Promise<MemberNeighboursDto> {
    return this.lists.neighbours(scope.projectId, memberId, query);
  }

  @Get(':memberId')
  @DesignTeam()
  @Returns(memberSheetDtoSchema, 'One member with its result, drawing, working, charts and history.')
  sheet(@Scope() scope: ProjectScope, @Param('memberId', idParam) memberId: string): Promise<MemberSheetDto> {
    return this.sheets.sheet(scope.projectId, memberId);
  }

  @Post()
  @Roles('specifier')
  @Returns(memberDtoSchema, 'Adds a member; lengths in mm.')
  create(@Scope() scope: ProjectScope, @Body({ schema: memberInputSchema }) input: MemberInput): Promise<MemberDto> {
    return this.members.create(scope, input);
  }

  /** All or none of them. */
  @Post('bulk')
  @HttpCode(HttpStatus.OK)
  @Roles('specifier')
  @Returns(membersChangedDtoSchema, 'Sets the same fields of several members, all or none.')
  setMany(@Scope() scope: ProjectScope, @Body({ schema: bulkMemberSchema }) input: BulkMember): Promise<MembersChangedDto> {
    return this.bulk.setMany(scope, input);
  }

  /** Writes nothing: how many the same body would change. */
  @Post('bulk/preview')
  @HttpCode(HttpStatus.OK)
  @Roles('specifier')
  @Returns(previewAnswerDtoSchema, 'Counts what the same body would change, and changes nothing.')
  preview(@Scope() scope: ProjectScope, @Body({ schema: bulkMemberSchema }) input: BulkMember): Promise<PreviewAnswerDto> {
    return this.bulk.preview(scope, input);
  }

  @Post('structural')
  @HttpCode(HttpStatus.OK)
  @Roles('structural-engineer')
  @Returns(membersChangedDtoSchema, 'Sets how the critical temperature of several members comes about, all or none.')
  setStructuralMany(@Scope() scope: ProjectScope, @Body({ schema: bulkStructuralSchema }) input: BulkStructural): Promise<MembersChangedDto> {
    return this.bulk.setStructural(scope, input);
  }

  @Post('delete')
  @HttpCode(HttpStatus.OK)
  @Roles('specifier')
  @Returns(membersDeletedDtoSchema, 'Removes several members, all or none.')
  removeMany(@Scope() scope: ProjectScope, @Body({ schema: memberChoiceSchema }) input: MemberChoice): Promise<{ deleted: number }> {
    return this.bulk.removeMany(scope, input);
  }

  @Patch(':memberId')
  @Roles('specifier')
  @Returns(memberDtoSchema, 'Changes what the specifier decides of a member; needs the version that was read.')
  update(@Scope() scope: ProjectScope, @Param('memberId', idParam) memberId: string, @Body({ schema: memberUpdateSchema }) input: MemberUpdate): Promise<MemberDto> {
    return this.members.update(scope, memberId, input);
  }

  @Put(':memberId/structural')
  @Roles('structural-engineer')
  @Returns(memberDtoSchema, 'Sets where the critical temperature comes from: declared (°C), utilisation, actions (kN, kNm), assumed.')
  setStructural(
    @Scope() scope: ProjectScope, @Param('memberId', idParam) memberId: string, @Body({ schema: memberStructuralSchema }) input: MemberStructural,
  ): Promise<MemberDto> {
    return this.members.setStructural(scope, memberId, input);
  }

  @Delete(':memberId')
  @HttpCode(HttpStatus.NO_CONTENT)
  @Roles('specifier')
  @ReturnsNothing('Removes a member; needs the version that was read.')
  remove(@Scope() scope: ProjectScope, @Param('memberId', idParam) memberId: string, @Query({ schema: memberDeleteQuerySchema }) { version }: { version: number }): Promise<void> {
    return this.members.remove(scope, memberId, version);
  }
}

/** The fire engineer's signatures under assumed and high temperatures and under leaving steel bare. */
@Controller('projects/:projectId/acceptances')
export class AcceptancesController {
  constructor(private readonly acceptances: AcceptancesService) {}

  @Post()
  @HttpCode(HttpStatus.OK)
  @Roles('fire-engineer')
  @Returns(membersAcceptedDtoSchema, 'Signs an assumed or high critical temperature, or bare steel, of several members.')
  accept(@Scope() scope: ProjectScope, @Body({ schema: acceptanceSchema }) input: Acceptance): Promise<{ accepted: number }> {
    return this.acceptances.accept(scope, input);
  }

  @Delete()
  @Roles('fire-engineer')
  @Returns(acceptancesWithdrawnDtoSchema, 'Withdraws signatures from several members.')
  withdraw(@Scope() scope: ProjectScope, @Body({ schema: acceptanceWithdrawalSchema }) input: AcceptanceWithdrawal): Promise<{ withdrawn: number }> {
    return this.acceptances.withdraw(scope, input);
  }
}
