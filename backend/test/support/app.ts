import 'reflect-metadata';
import type { Role } from '@mantlet/common';
import { defaultProjectSettings, roles } from '@mantlet/common';
import type { NestExpressApplication } from '@nestjs/platform-express';
import passport from 'passport';
import request from 'supertest';
import { DataSource } from 'typeorm';
import { createApp } from '../../src/create-app.js';
import { Membership } from '../../src/features/memberships/membership.entity.js';
import { Project } from '../../src/features/projects/project.entity.js';
import { PasswordService } from '../../src/features/users/password.service.js';
import { User } from '../../src/features/users/user.entity.js';
import { AnswerCheck } from './answers.js';
import { createTestDatabase } from './database.js';
import { TestMail } from './mail.js';

export type Agent = ReturnType<typeof request.agent>;
const PASSWORD = 'a long test password';

/** The whole server on a database of its own, spoken to over HTTP as each person would. */
export class TestApp {
  private counter = 0;
  private passwordHash: string | null = null;
  readonly answers: AnswerCheck;

  private constructor(
    readonly app: NestExpressApplication,
    readonly dataSource: DataSource,
    /** what was mailed */
    readonly mail: TestMail,
    private readonly dropDatabase: () => Promise<void>,
  ) {
    this.answers = new AnswerCheck(app);
  }

  static async start(options: { catalogue?: boolean; secureCookies?: boolean; smtpUrl?: string; clientDir?: string; caughtMail?: 'for-everybody' } = {}): Promise<TestApp> {
    const database = await createTestDatabase(options.catalogue ? 'catalogue' : 'migrated');
    const mail = await TestMail.start();
    // passport keeps one list for the process, and would ask the first application who signs in to the second
    Object.assign(passport, { _serializers: [], _deserializers: [] });
    const secureCookies = options.secureCookies ?? false;
    const app = await createApp({
      databaseUrl: database.url, sessionSecret: 'test secret', secureCookies, quiet: true, clientDir: options.clientDir, caughtMailDir: secureCookies ? undefined : mail.folder,
      mail: { smtpUrl: options.smtpUrl ?? mail.smtpUrl, from: 'Mantlet <mantlet@example.test>', publicUrl: 'http://mantlet.example.test', caught: !secureCookies && (options.caughtMail ?? 'for-this-machine'), retryDelaysMs: [20, 20] },
    });
    await app.init();
    return new TestApp(app, app.get(DataSource), mail, database.drop);
  }

  /** Fails where an answer did not fit what its route states. */
  async stop(): Promise<void> {
    await this.app.close();
    await this.mail.stop();
    await this.dropDatabase();
    if (this.answers.faults.size) throw new Error(`answers that do not fit what their routes state:\n${[...this.answers.faults].join('\n')}`);
  }

  anonymous(): Agent {
    const agent = request.agent(this.app.getHttpServer());
    agent.use((sent: request.Test) => {
      sent.on('response', ({ status, type, text, body }: request.Response) => {
        this.answers.check({ method: sent.method, path: new URL(sent.url).pathname, status, type, text, body });
      });
    });
    return agent;
  }

  async makeUser(name: string, options: { administrator?: boolean } = {}): Promise<User> {
    this.passwordHash ??= await this.app.get(PasswordService).hash(PASSWORD);
    this.counter += 1;
    const email = `${name.toLowerCase().replace(/[^a-z]+/g, '.')}.${this.counter}@example.test`;
    return this.dataSource.manager.save(
      this.dataSource.manager.create(User, { name, email, passwordHash: this.passwordHash, administrator: options.administrator ?? false }),
    );
  }

  async signIn(user: User): Promise<Agent> {
    const agent = this.anonymous();
    await agent.post('/api/session').send({ email: user.email, password: PASSWORD }).expect(200);
    return agent;
  }

  async makeProject(settings = defaultProjectSettings): Promise<Project> {
    this.counter += 1;
    return this.dataSource.manager.save(
      this.dataSource.manager.create(Project, { number: `T-${this.counter}`, name: `Test project ${this.counter}`, place: 'Nowhere', settings }),
    );
  }

  async join(project: Project, user: User, ...held: Role[]): Promise<void> {
    await this.dataSource.manager.save(this.dataSource.manager.create(Membership, { projectId: project.id, userId: user.id, roles: held }));
  }

  /** One signed-in person for each role on the project, by role. */
  async team(project: Project): Promise<Record<Role, Agent>> {
    const entries = await Promise.all(
      roles.map(async (role): Promise<[Role, Agent]> => {
        const user = await this.makeUser(`The ${role}`);
        await this.join(project, user, role);
        return [role, await this.signIn(user)];
      }),
    );
    return Object.fromEntries(entries) as Record<Role, Agent>;
  }
}
