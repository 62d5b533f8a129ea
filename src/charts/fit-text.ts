/** Mean advance of a letter at 12 px: Plex Sans, and Plex Mono where all are alike. */
const LETTER = { sans: 6.0, mono: 7.2 } as const;

export type Face = keyof typeof LETTER;

/** About how wide words of 12 px come out, px. */
export function textWidth(text: string, face: Face): number {
  return text.length * LETTER[face];
}

/** Words in lines of a width, px; a word longer than that has a line of its own. */
export function wrapText(text: string, width: number, face: Face = 'sans'): string[] {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const line = lines.at(-1);
    if (line !== undefined && textWidth(`${line} ${word}`, face) <= width)
      lines[lines.length - 1] = `${line} ${word}`;
    else lines.push(word);
  }
  return lines;
}

/** Words cut to a width, px, with an ellipsis; never below three letters. */
export function fitText(text: string, width: number, face: Face = 'sans'): string {
  const letters = Math.max(3, Math.floor(width / LETTER[face]));
  return text.length <= letters ? text : `${text.slice(0, letters - 1).trimEnd()}…`;
}
