import { DOUBLE, i32, increase, loop, pair, PAIR, routine, set, type Code } from './assembler';
import { SIDE } from '../lattice-product';

/** Bytes of one node of a block. */
const NODE = DOUBLE * SIDE;

/**
 * `latticeProduct` over packed rows, four rows by four columns side by side, then two, then one. Every sum runs from the lowest
 * node up by itself. `blocks` … `blocksEnd` hold from and to of each block as whole numbers, `stride` is the bytes of a column,
 * and `out` has room for whole blocks of rows.
 */
export const product = routine(
  'product',
  ['blocks', 'blocksEnd', 'weights', 'columns', 'count', 'stride', 'out'],
  ['first', 'end', 'c', 'column', 'weight', 'x', 'to'],
  ['upperRows', 'lowerRows', 'factor', 'a0', 'b0', 'a1', 'b1', 'a2', 'b2', 'a3', 'b3'],
  (locals) => {
    const { blocks, blocksEnd, weights, columns, count, stride, out } = locals;
    const { first, end, c, column, weight, x, to, upperRows, lowerRows, factor } = locals;
    const { a0, a1, a2, a3, b0, b1, b2, b3 } = locals;
    /** of each column, rows 1 and 2 of the block, then rows 3 and 4 */
    const sums = [
      [a0, b0],
      [a1, b1],
      [a2, b2],
      [a3, b3],
    ] as const;
    const sideBySide = (wide: number): Code => {
      const used = sums.slice(0, wide);
      return [
        ...used.flat().flatMap((sum) => set(sum, pair.twice(0))),
        ...set(column, i32.add(columns, i32.add(i32.mul(c, stride), first))),
        ...set(weight, weights),
        ...loop(weight, end, NODE, [
          ...set(upperRows, pair.load(weight)),
          ...set(lowerRows, pair.load(weight, PAIR)),
          ...set(x, column),
          ...used.flatMap(([a, b]) => [
            ...set(factor, pair.loadTwice(x)),
            ...set(a, pair.add(a, pair.mul(upperRows, factor))),
            ...set(b, pair.add(b, pair.mul(lowerRows, factor))),
            ...increase(x, stride),
          ]),
          ...increase(column, i32.value(DOUBLE)),
        ]),
        ...set(to, i32.add(out, i32.bytes(c))),
        ...[0, 1].flatMap((rows) =>
          [0, 1].flatMap((half) => [
            ...used.flatMap((sum, k) => pair.storeHalf(to, sum[rows]!, half, DOUBLE * k)),
            ...increase(to, i32.bytes(count)),
          ]),
        ),
      ];
    };
    const columnsBy = (wide: number): Code =>
      loop(c, i32.sub(count, i32.value(wide - 1)), wide, sideBySide(wide));
    const from = i32.load(blocks);
    const nodes = i32.sub(i32.load(blocks, 4), from);
    return loop(blocks, blocksEnd, DOUBLE, [
      ...set(first, i32.bytes(from)),
      ...set(end, i32.add(weights, i32.mul(nodes, i32.value(NODE)))),
      ...set(c, i32.value(0)),
      ...columnsBy(4),
      ...columnsBy(2),
      ...columnsBy(1),
      ...set(weights, end),
      ...increase(out, i32.mul(i32.bytes(count), i32.value(SIDE))),
    ]);
  },
);
