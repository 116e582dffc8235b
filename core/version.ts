/**
 * Version of the arithmetic and of what a record means. It is part of every stamp: raise it whenever the same inputs
 * may come to other bits.
 */
export const CORE_VERSION = '2';
