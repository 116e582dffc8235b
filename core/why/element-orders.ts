/** Six numbers that stand in another order than they were read: slot k of xx yy zz xy xz yz is number `slots[k]`. */
export interface ElementOrder {
  readonly words: string;
  readonly slots: readonly [number, number, number, number, number, number];
}

const NAMES = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'];

/** An order by the sequence in which the numbers really stand. */
function order(...sequence: string[]): ElementOrder {
  const slots = NAMES.map((name) => sequence.indexOf(name)) as unknown as ElementOrder['slots'];
  return { words: `with its elements in the order ${sequence.join(' ')}`, slots };
}

export const ELEMENT_ORDERS: readonly ElementOrder[] = [
  order('xx', 'xy', 'xz', 'yy', 'yz', 'zz'),
  order('xx', 'xy', 'yy', 'xz', 'yz', 'zz'),
  order('xx', 'yy', 'zz', 'xy', 'yz', 'xz'),
  order('xx', 'yy', 'zz', 'xz', 'xy', 'yz'),
  order('xx', 'yy', 'zz', 'yz', 'xz', 'xy'),
  order('xx', 'yy', 'zz', 'yz', 'xy', 'xz'),
  order('xx', 'yy', 'zz', 'xz', 'yz', 'xy'),
];
