import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';

/** Keeps results current with their inputs. */
@Injectable()
export class AssessmentService {
  /**
   * Assesses anew the members of these zones (all zones where null) and their zone targets, in the caller's transaction.
   * Call it after every change to anything that enters a result.
   */
  async recompute(_manager: EntityManager, _projectId: string, _zoneIds: string[] | null): Promise<{ members: number; changed: number }> {
    return { members: 0, changed: 0 };
  }
}
