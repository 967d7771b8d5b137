import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post } from '@nestjs/common';
import { invitationInputSchema, userDtoSchema, userUpdateSchema } from '@mantlet/common';
import type { InvitationInput, UserDto, UserUpdate } from '@mantlet/common';
import { z } from 'zod';
import { AdministratorOnly, CurrentActor } from '../../shared/access.js';
import type { Actor } from '../../shared/access.js';
import { Returns, ReturnsNothing } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { InvitationsService } from './invitations.service.js';
import { UsersService } from './users.service.js';

@Controller('users')
export class UsersController {
  constructor(
    private readonly users: UsersService,
    private readonly invitations: InvitationsService,
  ) {}

  @Get()
  @AdministratorOnly()
  @Returns(z.array(userDtoSchema), 'Every account.')
  list(): Promise<UserDto[]> {
    return this.users.list();
  }

  @Post()
  @AdministratorOnly()
  @Returns(userDtoSchema, 'Makes an account and mails its person the link by which they choose a password.')
  async invite(@Body({ schema: invitationInputSchema }) input: InvitationInput, @CurrentActor() actor: Actor): Promise<UserDto> {
    return this.users.find(await this.invitations.invite(input, actor));
  }

  @Patch(':userId')
  @AdministratorOnly()
  @Returns(userDtoSchema, 'Renames an account, makes or unmakes an administrator, disables or enables.')
  update(@Param('userId', idParam) userId: string, @Body({ schema: userUpdateSchema }) input: UserUpdate, @CurrentActor() actor: Actor): Promise<UserDto> {
    return this.users.update(userId, input, actor);
  }

  @Post(':userId/invitation')
  @AdministratorOnly()
  @Returns(userDtoSchema, 'Sends the invitation again, with a new link; the old one is dead.')
  async inviteAgain(@Param('userId', idParam) userId: string, @CurrentActor() actor: Actor): Promise<UserDto> {
    return this.users.find(await this.invitations.sendAgain(userId, actor));
  }

  @Delete(':userId/invitation')
  @HttpCode(204)
  @AdministratorOnly()
  @ReturnsNothing('Withdraws an invitation that was not accepted; the account goes with it.')
  withdraw(@Param('userId', idParam) userId: string, @CurrentActor() actor: Actor): Promise<void> {
    return this.invitations.withdraw(userId, actor);
  }
}
