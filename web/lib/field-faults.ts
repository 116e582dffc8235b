import { ApiProblem } from '#web/api/api-problem.ts';
import { asSentence } from './sentence.ts';

/** Refusals that are about one field of a form, by the server's code. */
const FIELD_OF: Readonly<Record<string, string>> = {
  PASSWORD_COMMON: 'password',
  PASSWORD_TOO_LONG: 'password',
  PASSWORD_WRONG: 'current',
  PROJECT_EXISTS: 'slug',
  REMOVAL_NOT_MEANT: 'slug',
  MEMBER_ALREADY: 'email',
};

/**
 * A refusal as faults of the form's own fields.
 *
 * @returns null where it is about none of them
 */
export function fieldFaultsOf(error: unknown, values: FormData): Record<string, string> | null {
  if (!(error instanceof ApiProblem)) return null;
  const field = FIELD_OF[error.code];
  if (field !== undefined && values.has(field)) return { [field]: sentences(error.detail, error.hint) };
  if (error.code !== 'BODY_NOT_RIGHT') return null;
  const found = error.faults.flatMap(({ message }): [string, string][] => {
    const [, name = '', what = ''] = /^([\w-]+)[\w.-]*: (.*)$/s.exec(message) ?? [];
    return values.has(name) ? [[name, sentences(what)]] : [];
  });
  return found.length > 0 ? Object.fromEntries(found) : null;
}

const sentences = (...texts: readonly (string | undefined)[]): string =>
  texts
    .filter((text) => text !== undefined && text !== '')
    .map((text) => asSentence(text!))
    .join(' ');
