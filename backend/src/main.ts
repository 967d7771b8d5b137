import 'reflect-metadata';
import { Logger } from '@nestjs/common';
import { createApp } from './create-app.js';
import { caughtMailDir, caughtMailForEverybody, clientDir, databaseUrl, host, mailFrom, port, publicUrl, secureCookies, sessionSecret, smtpUrl } from './shared/environment.js';

const app = await createApp({
  databaseUrl: databaseUrl(), sessionSecret: sessionSecret(), secureCookies: secureCookies(), clientDir: clientDir(), caughtMailDir: caughtMailDir(),
  mail: { smtpUrl: smtpUrl(), from: mailFrom(), publicUrl: publicUrl(), caught: caughtMailDir() !== undefined && (caughtMailForEverybody() ? 'for-everybody' : 'for-this-machine'), retryDelaysMs: [5_000, 30_000, 120_000] },
});
app.enableShutdownHooks();
await app.listen(port(), host());
new Logger('Mantlet').log(`Listening on http://${host()}:${port()}`);
