// The yardstick: a process that only parses the text with the fastest well-kept YAML parser, every scalar as text.
import { readFileSync } from 'node:fs';
import { FAILSAFE_SCHEMA, load } from 'js-yaml';

load(readFileSync(process.argv[2], 'utf8'), { schema: FAILSAFE_SCHEMA });
