import { addressOf } from '#core/api/routes.ts';
import { queryOf } from './client.ts';

/** One run with its record, its release and its comments. */
export const runQuery = (project: string, run: string) => queryOf('showRun', { places: { project, run } });

/** The texts of a run's inputs. */
export const inputsQuery = (project: string, run: string) =>
  queryOf('showInputs', { places: { project, run } });

export const recordAddress = (project: string, run: string) => addressOf('downloadRecord', { project, run });
export const partsAddress = (project: string, run: string) => addressOf('downloadParts', { project, run });
export const urdfAddress = (project: string, run: string) => addressOf('downloadUrdf', { project, run });
export const drawingAddress = (project: string, run: string) =>
  addressOf('downloadDrawing', { project, run });
