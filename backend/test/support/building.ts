import { randomUUID } from 'node:crypto';
import { Level } from '../../src/features/levels/level.entity.js';
import { Member } from '../../src/features/members/member.entity.js';
import type { Project } from '../../src/features/projects/project.entity.js';
import { Section } from '../../src/features/sections/section.entity.js';
import { Zone } from '../../src/features/zones/zone.entity.js';
import { sectionProperties } from '../../src/calc/index.js';
import type { TestApp } from './app.js';

/** Rows put straight into the database, for tests of what rests on them. */
export const build = {
  level: (app: TestApp, project: Project, code: string, elevationM = 0): Promise<Level> =>
    app.dataSource.manager.save(app.dataSource.manager.create(Level, { projectId: project.id, code, name: `Level ${code}`, elevationM, heightM: 4 })),

  zone: (app: TestApp, level: Level, code: string, periodMin = 60): Promise<Zone> =>
    app.dataSource.manager.save(
      app.dataSource.manager.create(Zone, { projectId: level.projectId, levelId: level.id, code, name: `Zone ${code}`, periodMin, curve: { kind: 'standard' } }),
    ),

  /** a plate girder of the project's own, so that no catalogue is needed */
  section: (app: TestApp, project: Project): Promise<Section> => {
    const shape = { kind: 'i' as const, hMm: 300, bMm: 150, twMm: 8, tfMm: 12, rootRadiusMm: 0 };
    return app.dataSource.manager.save(
      app.dataSource.manager.create(Section, {
        projectId: project.id, family: 'CUSTOM', designation: 'PG', designationKey: `PG${randomUUID()}`, shape, properties: sectionProperties(shape),
      }),
    );
  },

  /** a beam with a declared critical temperature of 550 °C */
  beam: (app: TestApp, zone: Pick<Zone, 'id' | 'projectId'>, section: Section, mark: string): Promise<Member> =>
    app.dataSource.manager.save(
      app.dataSource.manager.create(Member, {
        projectId: zone.projectId, zoneId: zone.id, mark, memberType: 'beam', sectionId: section.id, grade: 'S355', lengthMm: 6000, quantity: 1,
        exposure: { arrangement: 'three-sides', reason: '' }, protectionForm: 'profile', basis: { way: 'declared', temperatureC: 550, reference: 'test' },
      }),
    ),
};
