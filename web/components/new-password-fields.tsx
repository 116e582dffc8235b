import { useState } from 'react';
import { exactTextOf, faultsOf } from '#web/lib/form-values.ts';
import { PASSWORD_RULE, passwordFault } from '#web/lib/password.ts';
import { Field, Tick } from './field.tsx';
import type { FieldFaults } from './form.tsx';

/** A new password, written once; it can be looked at instead of being written twice. */
export function NewPasswordFields({ label = 'New password' }: { label?: string }) {
  const [seen, setSeen] = useState(false);
  return (
    <>
      <Field
        name="password"
        label={label}
        why={PASSWORD_RULE}
        type={seen ? 'text' : 'password'}
        autoComplete="new-password"
      />
      <Tick label="Show it" checked={seen} onChange={(event) => setSeen(event.target.checked)} />
    </>
  );
}

export function newPasswordFaults(values: FormData): FieldFaults {
  return faultsOf({ password: passwordFault(exactTextOf(values, 'password')) });
}
