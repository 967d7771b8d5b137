import { Body, Controller, Get, Param, Patch, Post } from '@nestjs/common';
import { userDtoSchema, userInputSchema, userUpdateSchema } from '@mantlet/common';
import type { UserDto, UserInput, UserUpdate } from '@mantlet/common';
import { z } from 'zod';
import { AdministratorOnly, CurrentActor } from '../../shared/access.js';
import type { Actor } from '../../shared/access.js';
import { Returns } from '../../shared/openapi/returns.js';
import { idParam } from '../../shared/validation.js';
import { UsersService } from './users.service.js';

@Controller('users')
export class UsersController {
  constructor(private readonly users: UsersService) {}

  @Get()
  @AdministratorOnly()
  @Returns(z.array(userDtoSchema), 'Every account.')
  list(): Promise<UserDto[]> {
    return this.users.list();
  }

  @Post()
  @AdministratorOnly()
  @Returns(userDtoSchema, 'Makes an account.')
  create(@Body({ schema: userInputSchema }) input: UserInput, @CurrentActor() actor: Actor): Promise<UserDto> {
    return this.users.create(input, actor);
  }

  @Patch(':userId')
  @AdministratorOnly()
  @Returns(userDtoSchema, 'Renames an account, makes or unmakes an administrator, disables or enables.')
  update(@Param('userId', idParam) userId: string, @Body({ schema: userUpdateSchema }) input: UserUpdate, @CurrentActor() actor: Actor): Promise<UserDto> {
    return this.users.update(userId, input, actor);
  }
}
