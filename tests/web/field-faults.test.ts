import { describe, expect, it } from 'vitest';
import { ApiProblem } from '#web/api/api-problem.ts';
import { fieldFaultsOf } from '#web/lib/field-faults.ts';

const form = (...names: string[]) => {
  const values = new FormData();
  for (const name of names) values.set(name, '');
  return values;
};
const problem = (code: string, detail: string, more: Partial<ApiProblem> = {}) =>
  new ApiProblem({ status: 400, title: '', code, detail, ...more, faults: [...(more.faults ?? [])] });

describe('a refusal', () => {
  it('stands at the field that it is about, as sentences', () => {
    const refused = problem('PASSWORD_WRONG', 'expected your password, found another', {
      hint: 'write it again',
    });
    expect(fieldFaultsOf(refused, form('current', 'password'))).toEqual({
      current: 'Expected your password, found another. Write it again.',
    });
  });

  it('is about no field where the form has none of that name', () => {
    expect(fieldFaultsOf(problem('PASSWORD_WRONG', 'x'), form('email'))).toBeNull();
  });

  it('of a body names each field by the path before its message', () => {
    const refused = problem('BODY_NOT_RIGHT', 'x', {
      faults: [
        { code: 'BODY_NOT_RIGHT', message: 'watchedBranches.3: too long' },
        { code: 'BODY_NOT_RIGHT', message: 'name: too short' },
      ],
    });
    expect(fieldFaultsOf(refused, form('name', 'watchedBranches'))).toEqual({
      watchedBranches: 'Too long.',
      name: 'Too short.',
    });
  });

  it('that is none of the server’s is about no field', () => {
    expect(fieldFaultsOf(new Error('name: x'), form('name'))).toBeNull();
  });
});
