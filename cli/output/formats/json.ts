/** What a terminal or a page could take as a command or as turned writing, in JSON's own escapes. */
const UNSAFE = /[\u007f-\u009f\u2028\u2029]|\p{Cf}/gu;

const escaped = (json: string): string =>
  json.replace(UNSAFE, (c) =>
    Array.from({ length: c.length }, (_, i) => `\\u${c.charCodeAt(i).toString(16).padStart(4, '0')}`).join(
      '',
    ),
  );

/** One document, in the order in which its fields were made; parses back equal. */
export const formatJson = (value: unknown): string => `${escaped(JSON.stringify(value, null, 2))}\n`;

/** One record a line. */
export const formatNdjson = (values: readonly unknown[]): string =>
  values.map((value) => `${escaped(JSON.stringify(value))}\n`).join('');
