/** What an assembly file holds: text, lists and mappings. Nothing is a number, a date or null yet. */
export type YamlValue = string | YamlValue[] | YamlMapping;

/** A mapping. Nothing is inherited: `__proto__` and `constructor` are keys like any other. */
export interface YamlMapping {
  [key: string]: YamlValue;
}

/** A step to a value inside another one: a key or an index. */
export type PathStep = string | number;

type MappingConstructor = new () => YamlMapping;

/**
 * Makes mappings. An empty object without a prototype stands behind each: as free of inherited names as
 * `Object.create(null)`, which engines keep as a slow hash table.
 */
export const Mapping: MappingConstructor = (() => {
  function Mapping() {}
  Mapping.prototype = Object.freeze(Object.create(null));
  return Mapping as unknown as MappingConstructor;
})();
