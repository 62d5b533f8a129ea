import type { ReactNode } from 'react';

const ADDRESS = /(https?:\/\/[^\s<>"]+)/g;

/** Plain text whose web addresses can be followed. */
export const linkedText = (text: string): ReactNode[] =>
  text.split(ADDRESS).map((part, i) =>
    i % 2 === 1 ? (
      <a key={i} href={part}>
        {part}
      </a>
    ) : (
      part
    ),
  );
