import { describe, expect, it } from 'vitest';
import { PASSWORD_AT_LEAST, passwordSchema, ROLES } from '#core/api/people.ts';
import { slugSchema } from '#core/api/projects.ts';
import { passwordFault } from '#web/lib/password.ts';
import { atLeast } from '#web/lib/roles.ts';
import { slugFault, slugOf } from '#web/lib/slug.ts';

describe('a project’s part of addresses', () => {
  it('is made of its name', () => {
    expect(slugOf('Plover  Arm (Mk II)')).toBe('plover-arm-mk-ii');
    expect(slugOf('Ångström')).toBe('angstrom');
  });

  it('that is made of a name is one that the server takes', () => {
    for (const name of ['Heron', ' -x- ', 'a'.repeat(200), `${'a'.repeat(59)} b`])
      expect(slugSchema.safeParse(slugOf(name)).success, name).toBe(true);
  });

  it('is refused here exactly where the server refuses it', () => {
    for (const slug of ['', 'a', 'a-b', '-a', 'a-', 'A', 'ä', 'a'.repeat(60), 'a'.repeat(61)])
      expect(slugFault(slug) === undefined, slug).toBe(slugSchema.safeParse(slug).success);
  });
});

describe('a new password', () => {
  it('is long enough here exactly where it is for the server', () => {
    for (const length of [0, PASSWORD_AT_LEAST - 1, PASSWORD_AT_LEAST, 72, 73])
      expect(passwordFault('x'.repeat(length)) === undefined).toBe(
        passwordSchema.safeParse('x'.repeat(length)).success,
      );
  });

  it('is measured in bytes', () => {
    expect(passwordFault('ü'.repeat(40))).toMatch(/bytes/);
  });
});

describe('roles', () => {
  it('stand in the contract’s order', () => {
    for (const [i, role] of ROLES.entries())
      for (const [k, needed] of ROLES.entries()) expect(atLeast(role, needed)).toBe(i >= k);
  });
});
