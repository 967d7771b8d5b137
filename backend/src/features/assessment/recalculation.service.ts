import { Injectable } from '@nestjs/common';
import { InjectDataSource } from '@nestjs/typeorm';
import { DataSource } from 'typeorm';
import type { EntityManager } from 'typeorm';
import { lockProject } from '../../shared/project-lock.js';
import { JobsService } from '../jobs/jobs.service.js';
import { AssessmentService } from './assessment.service.js';

/** a zone whose results were taken away, or that came while they were */
const pending = `FROM zones z JOIN levels l ON l.id = z.level_id JOIN members m ON m.zone_id = z.id LEFT JOIN member_results r ON r.member_id = m.id
  WHERE z.project_id = $1 AND r.member_id IS NULL`;

/** The worker's part of a large change: members that have no result get one, zone by zone, from the inputs as they then stand. */
@Injectable()
export class RecalculationService {
  constructor(
    @InjectDataSource() private readonly dataSource: DataSource,
    private readonly assessment: AssessmentService,
    private readonly jobs: JobsService,
  ) {}

  /** Ends when nothing is left to do, or after the zone in hand when asked to stop. May be called again at any time. @returns whether all is done */
  async run(projectId: string, stopping: () => boolean): Promise<boolean> {
    while (await this.dataSource.transaction((manager) => this.step(manager, projectId))) {
      if (stopping()) return false;
    }
    return true;
  }

  /** One zone in one transaction, so that what is done stays done and nobody waits for long. @returns false when there was none */
  private async step(manager: EntityManager, projectId: string): Promise<boolean> {
    await lockProject(manager, projectId);
    const [zone] = await manager.query<{ id: string }[]>(`SELECT z.id ${pending} GROUP BY z.id, l.id ORDER BY l.elevation_m, l.code, z.code LIMIT 1`, [projectId]);
    if (!zone) {
      await this.jobs.finish(manager, projectId, 'recalculation');
      return false;
    }
    const { members } = await this.assessment.assess(manager, projectId, [zone.id]);
    const [left] = await manager.query<{ n: number }[]>(`SELECT count(*)::int AS n ${pending}`, [projectId]);
    await this.jobs.progress(manager, projectId, 'recalculation', members, left?.n ?? 0);
    return true;
  }
}
