/**
 * A user's text made safe to print: control and format characters (escape sequences, turned writing, line breaks),
 * lone surrogates and what no character is stand as `\x1b` or `\u{202e}`.
 */
export function plainText(text: string): string {
  return text.replace(UNSAFE, (c) => {
    const code = c.codePointAt(0)!;
    return code < 0x100 ? `\\x${code.toString(16).padStart(2, '0')}` : `\\u{${code.toString(16)}}`;
  });
}

const UNSAFE = /[\p{Cc}\p{Cf}\p{Cs}\p{Zl}\p{Zp}\p{Noncharacter_Code_Point}]/gu;
