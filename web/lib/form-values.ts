/** One entry of a form as text, without blanks around it. */
export function textOf(values: FormData, name: string): string {
  const value = values.get(name);
  return typeof value === 'string' ? value.trim() : '';
}

/** One entry as it was written; for passwords. */
export function exactTextOf(values: FormData, name: string): string {
  const value = values.get(name);
  return typeof value === 'string' ? value : '';
}

/** Keeps the faults that are some. */
export function faultsOf(
  found: Readonly<Record<string, string | undefined | false>>,
): Record<string, string> {
  return Object.fromEntries(
    Object.entries(found).filter((entry): entry is [string, string] => Boolean(entry[1])),
  );
}

/** What is wrong with a mail address as far as can be seen. */
export function emailFault(email: string): string | undefined {
  if (email === '') return 'Write an e-mail address.';
  return /^\S+@\S+\.\S+$/.test(email) ? undefined : 'An e-mail address looks like name@example.org.';
}
