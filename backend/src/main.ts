import 'reflect-metadata';
import { Logger } from '@nestjs/common';
import { createApp } from './create-app.js';
import { clientDir, databaseUrl, host, port, secureCookies, sessionSecret } from './shared/environment.js';

const app = await createApp({ databaseUrl: databaseUrl(), sessionSecret: sessionSecret(), secureCookies: secureCookies(), clientDir: clientDir() });
app.enableShutdownHooks();
await app.listen(port(), host());
new Logger('Mantlet').log(`Listening on http://${host()}:${port()}`);
