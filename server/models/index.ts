import type { Sequelize } from 'sequelize';
import { AuditEntry } from './audit-entry.ts';
import { Choice } from './choice.ts';
import { Comment } from './comment.ts';
import { Input } from './input.ts';
import { Invitation } from './invitation.ts';
import { Mail } from './mail.ts';
import { Membership } from './membership.ts';
import { Person } from './person.ts';
import { Project } from './project.ts';
import { StoredRecord } from './record.ts';
import { Release } from './release.ts';
import { Reset } from './reset.ts';
import { Run } from './run.ts';
import { Session } from './session.ts';
import { SignInFailure } from './sign-in-failure.ts';
import { Token } from './token.ts';

export {
  AuditEntry,
  Choice,
  Comment,
  Input,
  Invitation,
  Mail,
  Membership,
  Person,
  Project,
  Release,
  Reset,
  Run,
  Session,
  SignInFailure,
  StoredRecord,
  Token,
};

/** Binds every model to a database and says how they belong together. */
export function mapModels(sequelize: Sequelize): void {
  for (const model of [
    AuditEntry,
    Choice,
    Comment,
    Input,
    Invitation,
    Mail,
    Membership,
    Person,
    Project,
    Release,
    Reset,
    Run,
    Session,
    SignInFailure,
    StoredRecord,
    Token,
  ])
    model.map(sequelize);
  Membership.belongsTo(Person, { as: 'person', foreignKey: 'personId' });
  Membership.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Invitation.belongsTo(Person, { as: 'inviter', foreignKey: 'invitedBy' });
  Invitation.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Token.belongsTo(Project, { as: 'project', foreignKey: 'projectId' });
  Token.belongsTo(Person, { as: 'person', foreignKey: 'personId' });
  Comment.belongsTo(Person, { as: 'person', foreignKey: 'personId' });
}
