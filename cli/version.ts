// Set by the build from package.json.
declare const STEELYARD_VERSION: string | undefined;

/** The version of the product, as package.json has it; "source" where it runs unbuilt. */
export const version: string = typeof STEELYARD_VERSION === 'string' ? STEELYARD_VERSION : 'source';
