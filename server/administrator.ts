import { migrate, openDatabase } from './database.ts';
import { localDatabase } from './local.ts';
import { AuditEntry, Person, Reset } from './models/index.ts';
import { hashSecret, newSecret } from './services/secrets.ts';

// npm run administrator -- EMAIL [NAME]: makes someone administrator, the first one too, and prints a link that sets
// the password. Whoever may run this may read the database, so it asks for no rights of its own.
const [email, ...words] = process.argv.slice(2);
if (!email || !/^[^@\s]+@[^@\s]+$/.test(email)) {
  process.stderr.write('usage: npm run administrator -- EMAIL [NAME]\n');
  process.exit(2);
}
const HOURS = 24;
const cluster = await localDatabase((line) => process.stderr.write(`steelyard: ${line}\n`));
const sequelize = openDatabase(cluster.url, 2);
try {
  await migrate(sequelize, cluster.url);
  const address = email.toLowerCase();
  const name = words.join(' ') || address.split('@')[0]!;
  const [person, isNew] = await Person.findOrCreate({
    where: { email: address },
    defaults: { email: address, name, passwordHash: null },
  });
  await person.update({ administrator: true, active: true });
  await AuditEntry.create({
    who: 'the command line',
    action: 'administrator.made',
    project: null,
    what: `made ${person.name} administrator`,
    address: null,
  });
  process.stdout.write(
    `${person.name} <${person.email}> is administrator${isNew ? ', with a new account' : ''}.\n`,
  );
  if (!person.passwordHash) {
    const link = newSecret();
    const expiresAt = new Date(Date.now() + HOURS * 3_600_000);
    await Reset.create({ personId: person.id, linkHash: hashSecret(link), expiresAt });
    const base = process.env.PUBLIC_URL ?? `http://127.0.0.1:${process.env.PORT ?? 4780}`;
    process.stdout.write(`Set the password within ${HOURS} hours: ${base}/reset/${link}\n`);
  }
} finally {
  await sequelize.close();
  await cluster.stop();
}
