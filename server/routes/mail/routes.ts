import { readMailFolder } from '../../mail/transport.ts';
import type { Handler } from '../route.ts';

const listDemoMail: Handler<'listDemoMail'> = async ({ deps }) => readMailFolder(deps.config.MAIL_FOLDER);

export const mailRoutes = { listDemoMail };
