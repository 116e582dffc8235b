export { BYTES_AT_MOST, decodeText } from './decode-text.ts';
export { LineTable } from './line-table.ts';
export type { Mark, Places } from './places.ts';
export { ALIASES_AT_MOST, NODES_AT_MOST, readYaml, type YamlFile } from './read-yaml.ts';
export type { PathStep, YamlMapping, YamlValue } from './value.ts';
