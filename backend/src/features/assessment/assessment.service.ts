import { Injectable } from '@nestjs/common';
import type { MemberChartsDto, MemberResultDto, SectionOutline, WorkingStepDto } from '@mantlet/common';
import type { EntityManager } from 'typeorm';

/** What the sheet of one member shows beside its stored result. */
export interface MemberExplanation {
  result: MemberResultDto;
  working: WorkingStepDto[];
  charts: MemberChartsDto | null;
  outline: SectionOutline | null;
}

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

  /** One member's result with its working, charts and outline, worked out from its inputs as they stand. 404 where it is not of the project. */
  async explain(_projectId: string, _memberId: string): Promise<MemberExplanation> {
    throw new Error('in work');
  }

  /** Whether every stored result was worked out from the inputs as they stand. */
  async isCurrent(_projectId: string): Promise<boolean> {
    throw new Error('in work');
  }
}
