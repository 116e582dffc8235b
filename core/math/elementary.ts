// Sine, power and their kin differ between engines in the last bit; these are fixed algorithms in plain
// arithmetic (ports of the FreeBSD and Cephes routines), so a result has the same bits everywhere.
export { default as acos } from '@stdlib/math-base-special-acos';
export { default as asin } from '@stdlib/math-base-special-asin';
export { default as atan } from '@stdlib/math-base-special-atan';
export { default as atan2 } from '@stdlib/math-base-special-atan2';
export { default as cos } from '@stdlib/math-base-special-cos';
export { default as sin } from '@stdlib/math-base-special-sin';
export { default as tan } from '@stdlib/math-base-special-tan';
