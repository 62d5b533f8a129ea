/** The look shared by inputs, selects and text areas. */
export const CONTROL_CLASS =
  'w-full min-w-0 rounded border border-edge bg-sheet px-2.5 py-1 text-base text-ink ' +
  'min-h-8 touch:min-h-11 touch:text-lg ' +
  'hover:border-ink focus-visible:outline-offset-0 ' +
  'disabled:cursor-not-allowed disabled:bg-sunken disabled:text-muted [&:is(input,textarea):read-only]:bg-sunken ' +
  'aria-invalid:border-rust aria-invalid:bg-rust-tint';
