import { type ComponentProps, type ReactNode, useId } from 'react';
import { useFieldFault } from './form.tsx';

interface FieldFrame {
  readonly name: string;
  readonly label: ReactNode;
  /** What is expected, under the label before anything is wrong. */
  readonly why?: ReactNode;
}

/** A labelled line to write in; what is wrong with it stands under it and is tied to it. */
export function Field({ label, why, ...input }: FieldFrame & Omit<ComponentProps<'input'>, 'name'>) {
  const tie = useTie(input.name, why !== undefined);
  return (
    <Frame label={label} why={why} tie={tie}>
      <input {...input} {...tie.control} />
    </Frame>
  );
}

export function TextField({ label, why, ...area }: FieldFrame & Omit<ComponentProps<'textarea'>, 'name'>) {
  const tie = useTie(area.name, why !== undefined);
  return (
    <Frame label={label} why={why} tie={tie}>
      <textarea {...area} {...tie.control} />
    </Frame>
  );
}

export function SelectField({ label, why, ...select }: FieldFrame & Omit<ComponentProps<'select'>, 'name'>) {
  const tie = useTie(select.name, why !== undefined);
  return (
    <Frame label={label} why={why} tie={tie}>
      <select {...select} {...tie.control} />
    </Frame>
  );
}

/** A box to tick with its text beside it. */
export function Tick({ label, ...input }: { label: ReactNode } & ComponentProps<'input'>) {
  return (
    <label className="tick">
      <input type="checkbox" {...input} />
      <span>{label}</span>
    </label>
  );
}

interface Tie {
  readonly fault: string | undefined;
  readonly id: string;
  readonly control: {
    readonly id: string;
    readonly 'aria-invalid': true | undefined;
    readonly 'aria-describedby': string | undefined;
  };
}

function useTie(name: string, hasWhy: boolean): Tie {
  const id = useId();
  const fault = useFieldFault(name);
  const described = [hasWhy && `${id}-why`, fault !== undefined && `${id}-fault`].filter(Boolean).join(' ');
  return {
    fault,
    id,
    control: {
      id,
      'aria-invalid': fault === undefined ? undefined : true,
      'aria-describedby': described === '' ? undefined : described,
    },
  };
}

function Frame({
  label,
  why,
  tie,
  children,
}: {
  label: ReactNode;
  why: ReactNode;
  tie: Tie;
  children: ReactNode;
}) {
  return (
    <div className="field">
      <label htmlFor={tie.id}>{label}</label>
      {why !== undefined && (
        <span className="why" id={`${tie.id}-why`}>
          {why}
        </span>
      )}
      {children}
      {tie.fault !== undefined && (
        <span className="fault" id={`${tie.id}-fault`}>
          {tie.fault}
        </span>
      )}
    </div>
  );
}
