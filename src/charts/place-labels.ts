export interface LabelWish {
  /** Where its middle would stand best, px. */
  y: number;
  height: number;
}

/**
 * Middles of labels in a column, each as near to its wish as the others let it: labels that would overlap form a
 * block around the mean of their wishes. The order of the wishes is kept.
 */
export function placeLabels(wishes: readonly LabelWish[], top: number, bottom: number): number[] {
  const blocks: { members: number[]; height: number; wishSum: number }[] = [];
  const startOf = (block: (typeof blocks)[number]) => {
    const ideal = block.wishSum / block.members.length;
    return Math.min(Math.max(ideal, top), Math.max(top, bottom - block.height));
  };
  const order = wishes.map((_, index) => index).toSorted((a, b) => (wishes[a]?.y ?? 0) - (wishes[b]?.y ?? 0));
  for (const index of order) {
    const wish = wishes[index] ?? { y: 0, height: 0 };
    let block = { members: [index], height: wish.height, wishSum: wish.y - wish.height / 2 };
    let above = blocks.at(-1);
    while (above && startOf(above) + above.height > startOf(block)) {
      blocks.pop();
      // The wish of a member for the block's start is its own start less what stands before it.
      block = {
        members: [...above.members, ...block.members],
        wishSum: above.wishSum + block.wishSum - above.height * block.members.length,
        height: above.height + block.height,
      };
      above = blocks.at(-1);
    }
    blocks.push(block);
  }
  const middles = Array.from({ length: wishes.length }, () => 0);
  for (const block of blocks) {
    let y = startOf(block);
    for (const index of block.members) {
      const height = wishes[index]?.height ?? 0;
      middles[index] = y + height / 2;
      y += height;
    }
  }
  return middles;
}
