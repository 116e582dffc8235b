import type { QueryInterface } from 'sequelize';

/** One step of the schema, and the way back. */
export interface Migration {
  readonly name: string;
  up(queryInterface: QueryInterface): Promise<void>;
  down(queryInterface: QueryInterface): Promise<void>;
}

/** A step in plain SQL; several statements are allowed, for no values are bound. */
export const sqlMigration = (name: string, up: string, down: string): Migration => ({
  name,
  up: async (queryInterface) => {
    await queryInterface.sequelize.query(up);
  },
  down: async (queryInterface) => {
    await queryInterface.sequelize.query(down);
  },
});
