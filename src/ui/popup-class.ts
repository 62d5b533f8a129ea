/** The sheet that menus and popovers are drawn on. */
export const POPUP_CLASS =
  'rounded border border-rule bg-sheet text-ink shadow-lift outline-none ' +
  'transition-opacity duration-100 data-ending-style:opacity-0 data-starting-style:opacity-0';
