import { Injectable } from '@nestjs/common';
import { signInSchema } from '@mantlet/common';
import { PassportStrategy } from '@nestjs/passport';
import { Strategy } from 'passport-local';
import type { Authenticated } from '../users/user-records.js';
import { UsersService } from '../users/users.service.js';

@Injectable()
export class LocalStrategy extends PassportStrategy(Strategy) {
  constructor(private readonly users: UsersService) {
    super({ usernameField: 'email', passwordField: 'password' });
  }

  async validate(email: string, password: string): Promise<Authenticated | false> {
    const input = signInSchema.safeParse({ email, password });
    return input.success ? ((await this.users.authenticate(input.data.email, input.data.password)) ?? false) : false;
  }
}
