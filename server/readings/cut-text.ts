/** At most so many signs, with … where something was left out. */
export const cut = (text: string, length: number): string =>
  text.length > length ? `${text.slice(0, length - 1)}…` : text;
