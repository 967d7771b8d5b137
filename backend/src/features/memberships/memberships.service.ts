import { Injectable } from '@nestjs/common';
import type { Role } from '@mantlet/common';
import { InjectRepository } from '@nestjs/typeorm';
import { Repository } from 'typeorm';
import { Membership } from './membership.entity.js';

/** Who is on a project's team, with which roles. */
@Injectable()
export class MembershipsService {
  constructor(@InjectRepository(Membership) private readonly memberships: Repository<Membership>) {}

  async rolesOf(projectId: string, userId: string): Promise<Role[]> {
    const membership = await this.memberships.findOneBy({ projectId, userId });
    return membership?.roles ?? [];
  }
}
