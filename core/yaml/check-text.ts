import { InputError } from '../errors.ts';
import { BYTES_AT_MOST, refuseTooLarge } from './decode-text.ts';
import { LineTable } from './line-table.ts';

/** Characters no assembly file needs and that spoil terminals: C0 and C1 controls but tab and line ends; half surrogate pairs. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: finding them is the point
const CONTROL_CHARACTER = /[\0-\x08\x0b\x0c\x0e-\x1f\x7f-\x84\x86-\x9f\ufffe\uffff]|\p{Surrogate}/u;

/** Whether text (a decoded scalar, say) holds a control character. */
export function hasControlCharacter(text: string): boolean {
  return CONTROL_CHARACTER.test(text);
}

/** How a character is named in messages: U+0007. */
export function characterName(character: string): string {
  return `U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}`;
}

/**
 * Refuses text that is too large or holds control characters, and drops a byte order mark.
 *
 * @throws InputError TEXT_TOO_LARGE, TEXT_CONTROL_CHARACTER
 */
export function checkText(text: string, file: string): string {
  if (text.length * 3 > BYTES_AT_MOST) refuseTooLarge(utf8Length(text), file);
  const body = text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
  const found = CONTROL_CHARACTER.exec(body);
  if (found === null) return body;
  throw new InputError([
    {
      code: 'TEXT_CONTROL_CHARACTER',
      message: `the text has the control character ${characterName(found[0])}`,
      at: { file, ...new LineTable(body).placeOf(found.index) },
      hint: 'delete it; an assembly file is plain text',
    },
  ]);
}

function utf8Length(text: string): number {
  if (text.length > BYTES_AT_MOST) return text.length;
  let length = text.length;
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code > 0x7ff) length += code >= 0xd800 && code <= 0xdfff ? 1 : 2;
    else if (code > 0x7f) length += 1;
  }
  return length;
}
