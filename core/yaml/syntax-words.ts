interface Words {
  code: string;
  message: string;
  hint?: string;
}

/** The parser's reasons in an engineer's words, by how the reason begins. The first that fits is taken. */
const WORDS: readonly (readonly [reason: string, message: string, hint?: string])[] = [
  [
    'bad indentation of a mapping entry',
    'this line is indented unlike the keys around it',
    'line the key up with its neighbours; text that contains ": " or starts with a bracket or quote must be quoted as a whole',
  ],
  [
    'bad indentation of a sequence entry',
    'this line is indented unlike the list around it',
    'line the "-" up with the others',
  ],
  [
    'deficient indentation',
    'this line belongs to a bracket or quote opened above and must be indented further',
    'indent the line, or close the bracket or quote',
  ],
  ['tab characters must not', 'a tab is used for indentation', 'indent with spaces'],
  [
    "expected ':' after a mapping key",
    'expected ":" after the key',
    'write "key: value", with a blank after the colon',
  ],
  [
    'can not read a block mapping entry; a multiline key',
    'expected ":" after the key on this line or the one above',
    'write "key: value", with a blank after the colon',
  ],
  ['a whitespace character is expected after the key-value', 'expected a blank after ":"'],
  [
    'missed comma between flow',
    'expected a comma or the closing bracket here',
    'quote text that contains brackets, braces or commas',
  ],
  ["expected the node content, but found ','", 'expected a value before the comma'],
  ['unexpected end of the stream within a flow', 'this bracket is never closed', 'close the bracket'],
  ['unexpected end of the stream within a double', 'this quote is never closed', 'close the quote'],
  ['unexpected end of the stream within a single', 'this quote is never closed', 'close the quote'],
  [
    'unexpected end of the document within a double',
    'the document ends inside a " quote that is never closed',
    'close the quote',
  ],
  [
    'unexpected end of the document within a single',
    "the document ends inside a ' quote that is never closed",
    'close the quote',
  ],
  [
    'unknown escape sequence',
    'no such escape after the backslash',
    'in " " write \\\\ for a backslash, or use \' \'',
  ],
  ['expected hexadecimal character', 'expected hexadecimal digits in the escape'],
  [
    'end of the stream or a document separator',
    'expected the end of the file, a key or a list item',
    'quote text that contains brackets, braces, quotes or ": "',
  ],
  ['a line break is expected', 'expected the line to end after "|" or ">"'],
  ['bad explicit indentation width', 'the number after "|" or ">" must be 1 to 9'],
  ['repeat of', 'a sign after "|" or ">" is repeated'],
  ['name of an anchor', 'expected a name after "&"'],
  ['name of an alias', 'expected a name after "*"', 'quote text that begins with "*"'],
  ['duplication of an anchor', 'a value has two anchors'],
  ['alias node should not', 'an alias can have no anchor or tag of its own'],
  ['expected valid JSON character', 'a control character stands in the quoted text'],
  ['the stream contains non-printable', 'a control character stands in the text'],
  ['unacceptable YAML version', 'the %YAML line names a version other than 1.2', 'delete the line'],
];

const TAG_REASONS = [
  'duplication of a tag',
  'tag ',
  'named tag',
  'undeclared tag',
  'unexpected end of the stream within a verbatim tag',
];
const DIRECTIVE_REASONS = [
  'directive',
  'YAML directive',
  'TAG directive',
  'ill-formed',
  'there is a previously',
  'duplication of %YAML',
];

/** The words for tags, which an assembly file has none of. */
export const TAG_WORDS: Words = {
  code: 'YAML_TAG',
  message: 'tags ("!") are not used in an assembly file',
  hint: 'delete the tag; quote text that begins with "!"',
};

/** Turns the parser's reason, and the character it stopped at, into code, message and hint. */
export function plainWords(reason: string, character = ' '): Words {
  if (reason.startsWith('nesting exceeded')) return TOO_DEEP_WORDS;
  if ('[{'.includes(character) && reason.startsWith('deficient')) return OPEN_BRACKET_WORDS;
  if (character === ':' && reason.startsWith('bad indentation of a mapping')) return SECOND_COLON_WORDS;
  const words = WORDS.find(([begin]) => reason.startsWith(begin));
  if (words !== undefined) return { code: 'YAML_SYNTAX', message: words[1], hint: words[2] };
  if (TAG_REASONS.some((begin) => reason.startsWith(begin))) return TAG_WORDS;
  if (DIRECTIVE_REASONS.some((begin) => reason.startsWith(begin))) {
    return {
      code: 'YAML_SYNTAX',
      message: 'a line beginning with "%" is not understood',
      hint: 'delete the line',
    };
  }
  return { code: 'YAML_SYNTAX', message: `not YAML: ${reason}` };
}

/** The words for nesting past the limit. */
export const TOO_DEEP_WORDS: Words = {
  code: 'YAML_TOO_DEEP',
  message: 'lists and mappings are nested more than 100 deep',
  hint: 'include a file of its own for the inner assembly',
};

const SECOND_COLON_WORDS: Words = {
  code: 'YAML_SYNTAX',
  message: 'this ":" makes a key where the value above or before it goes on',
  hint: 'quote text that contains ": ", or line the key up with its neighbours',
};

const OPEN_BRACKET_WORDS: Words = {
  code: 'YAML_SYNTAX',
  message: 'this bracket is not closed before a line that is not indented further than its own',
  hint: 'close the bracket, or indent the lines inside it',
};
