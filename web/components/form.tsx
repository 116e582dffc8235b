import {
  createContext,
  type FormEvent,
  type ReactNode,
  useContext,
  useEffect,
  useRef,
  useState,
} from 'react';
import { fieldFaultsOf } from '#web/lib/field-faults.ts';
import { Button } from './button.tsx';
import { ProblemNotice } from './problem-notice.tsx';

/** By a field's name, what is wrong with it and how to mend it. */
export type FieldFaults = Readonly<Record<string, string>>;

const FaultsContext = createContext<FieldFaults>({});
export const useFieldFault = (name: string): string | undefined => useContext(FaultsContext)[name];

/**
 * A form that keeps what was entered, checks it before it is sent, and moves the focus to what is wrong: to the first
 * field at fault, or to the server's answer.
 */
export function Form({
  act,
  acting = 'One moment…',
  kind,
  check,
  submit,
  wide = false,
  name,
  children,
  beside,
}: {
  /** On its button. */
  act: string;
  acting?: string;
  kind?: 'plain' | 'quiet' | 'grave';
  check?: (values: FormData) => FieldFaults;
  submit: (values: FormData, form: HTMLFormElement) => Promise<unknown>;
  wide?: boolean;
  /** What the form is for, where its section's head does not say it. */
  name?: string;
  children: ReactNode;
  /** Beside the button. */
  beside?: ReactNode;
}) {
  const [faults, setFaults] = useState<FieldFaults>({});
  const [error, setError] = useState<unknown>(null);
  const [busy, setBusy] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const notice = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (Object.keys(faults).length > 0)
      form.current?.querySelector<HTMLElement>('[aria-invalid="true"], [data-invalid]')?.focus();
  }, [faults]);
  useEffect(() => {
    if (error) notice.current?.focus();
  }, [error]);
  const send = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    if (busy) return;
    const values = new FormData(event.currentTarget);
    const found = check?.(values) ?? {};
    setFaults(found);
    setError(null);
    if (Object.keys(found).length > 0) return;
    setBusy(true);
    try {
      await submit(values, event.currentTarget);
    } catch (failure) {
      const ofFields = fieldFaultsOf(failure, values);
      if (ofFields) setFaults(ofFields);
      else setError(failure);
    } finally {
      setBusy(false);
    }
  };
  return (
    <form
      ref={form}
      className={`form ${wide ? 'wide' : ''}`}
      noValidate
      aria-label={name}
      onSubmit={(event) => void send(event)}
    >
      <FaultsContext value={faults}>
        {error !== null && <ProblemNotice error={error} ref={notice} />}
        {children}
        <div className="acts mt-0">
          <Button type="submit" kind={kind} aria-disabled={busy}>
            {busy ? acting : act}
          </Button>
          {beside}
        </div>
      </FaultsContext>
    </form>
  );
}
