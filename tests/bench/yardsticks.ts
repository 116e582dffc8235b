// A process beside the server, for `server-bench.ts`: a single-row read by primary key over the same middleware, and a
// bare Express handler that inserts one JSONB row a request.
import cookieParser from 'cookie-parser';
import express from 'express';
import helmet from 'helmet';
import { pino } from 'pino';
import { pinoHttp } from 'pino-http';
import { readConfig } from '#server/config.ts';
import { openDatabase } from '#server/database.ts';
import type { Deps } from '#server/deps.ts';
import { authenticate } from '#server/middleware/authenticate.ts';
import { authorize } from '#server/middleware/authorize.ts';
import { Run } from '#server/models/index.ts';

const config = readConfig(process.env);
const sequelize = openDatabase(config.DATABASE_URL, config.DATABASE_CONNECTIONS);
const log = pino({ level: config.LOG_LEVEL });
await sequelize.query('CREATE TABLE IF NOT EXISTS bare_rows (id bigserial PRIMARY KEY, body jsonb NOT NULL)');

const app = express();
app.post('/bare', express.json({ limit: '64mb' }), async (request, response) => {
  await sequelize.query('INSERT INTO bare_rows (body) VALUES ($1::jsonb)', {
    bind: [JSON.stringify(request.body)],
  });
  response.status(201).json({ status: 'created' });
});
app.use(pinoHttp({ logger: log, quietReqLogger: true }), helmet(), cookieParser());
app.get('/one/:project/:run', async (request, response) => {
  const caller = await authenticate(request, { config, sequelize } as Deps);
  const { project } = request.params;
  const access = await authorize(
    { method: 'GET', path: '', who: 'viewer', token: 'read' },
    project,
    caller,
    false,
  );
  const row = await Run.findOne({
    where: { id: request.params.run, projectId: access!.project.id },
    raw: true,
  });
  response.json(row);
});
app.listen(config.PORT, config.HOST, () => process.send?.('listening'));
