import { assembly } from './schema.ts';
import { type ShapeTable, shapeTableOf } from './shape-table.ts';

/**
 * The shape of an assembly file, from its schema. The build puts the table itself in this module's place, so that a file
 * without faults is read without loading the schema and its library.
 */
export const assemblyShape: ShapeTable = shapeTableOf(assembly);
