import type { FitResult } from '../../types';

/** True of a smooth or stepped ground: many cells of a fixed grid, which are no beds. */
export const hasCells = ({ reachedTarget }: Pick<FitResult, 'reachedTarget'>): boolean =>
  reachedTarget !== null;
