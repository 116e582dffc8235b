/** Of the package; put in by the build, and by hand where the server runs from source. */
declare const STEELYARD_VERSION: string | undefined;

export const version = typeof STEELYARD_VERSION === 'string' ? STEELYARD_VERSION : 'from source';
