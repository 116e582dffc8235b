import type { CreatedToken, Token } from '#core/api/people.ts';
import { request } from '#web/api/client.ts';
import { Field, SelectField } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { faultsOf, textOf } from '#web/lib/form-values.ts';

const DAYS_AT_MOST = 730;

/** Makes a token of one's own or of a machine. */
export function NewToken({
  project,
  made,
}: {
  project: string;
  made: (created: CreatedToken) => Promise<unknown>;
}) {
  return (
    <section aria-labelledby="new-token">
      <SectionHead title="Make a token" id="new-token">
        its secret is shown once
      </SectionHead>
      <Form
        act="Make it"
        acting="Making…"
        check={(values) =>
          faultsOf({
            label: textOf(values, 'label') === '' && 'Write what the token is for.',
            days: daysFault(textOf(values, 'days')),
          })
        }
        submit={async (values, form) => {
          const created = await request('createToken', {
            places: { project },
            body: {
              kind: textOf(values, 'kind') as Token['kind'],
              label: textOf(values, 'label'),
              scope: textOf(values, 'scope') as Token['scope'],
              days: Number(textOf(values, 'days')),
            },
          });
          form.reset();
          await made(created);
        }}
      >
        <Field
          name="label"
          label="What for"
          why="Such as: CI of the airframe"
          maxLength={100}
          autoComplete="off"
        />
        <SelectField name="kind" label="Whose" defaultValue="machine">
          <option value="machine">a machine’s: stays when you leave the project</option>
          <option value="person">yours: ends with your role</option>
        </SelectField>
        <SelectField name="scope" label="May" defaultValue="push">
          <option value="push">push runs, and read</option>
          <option value="read">read only</option>
        </SelectField>
        <Field
          name="days"
          label="Days until it expires"
          why={`From 1 to ${DAYS_AT_MOST}.`}
          inputMode="numeric"
          defaultValue="365"
          autoComplete="off"
        />
      </Form>
    </section>
  );
}

function daysFault(text: string): string | undefined {
  const days = Number(text);
  if (/^\d+$/.test(text) && days >= 1 && days <= DAYS_AT_MOST) return undefined;
  return `Write a whole number from 1 to ${DAYS_AT_MOST}.`;
}
