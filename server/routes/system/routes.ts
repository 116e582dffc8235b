import { openApiDocument } from '../../openapi.ts';
import { type Handler, SENT } from '../route.ts';

const health: Handler<'health'> = async () => ({ status: 'ok' });

const ready: Handler<'ready'> = async ({ deps, response }) => {
  try {
    await deps.sequelize.query('SELECT 1');
    return { status: 'ready' };
  } catch {
    response.status(503).json({ status: 'not ready' });
    return SENT;
  }
};

let document: object | null = null;

const openApi: Handler<'openApi'> = async ({ deps }) => {
  document ??= openApiDocument(deps.config.PUBLIC_URL);
  return document;
};

export const systemRoutes = { health, ready, openApi };
