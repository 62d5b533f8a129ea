import { Fragment } from 'react';

/** A number and its unit, a symbol and what it equals: a plain space there is one that no line breaks at. */
const BEFORE_UNIT = /(?<=\d) (?=(?:Ω·m²?|m|S|%|σ)(?![\p{L}\d]))/gu;
/** Within a word a line would break after these all the same. */
const BREAKS_WITHIN = /[/\u2013\u00a0]/;

/** Words from the engine as they are, but that no line break parts "S = h/ρ", "χ²/N", "12.4–36.0" or "95 %". */
export function Sentence({ text }: { text: string }) {
  return text
    .replace(BEFORE_UNIT, '\u00a0')
    .split(/( )/)
    .map((word, index) =>
      BREAKS_WITHIN.test(word) ? (
        <span key={index} className="whitespace-nowrap">
          {word}
        </span>
      ) : (
        <Fragment key={index}>{word}</Fragment>
      ),
    );
}
