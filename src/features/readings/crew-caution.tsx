/** What keeps a crew from harm; always at hand on the sheet that is filled in beside the cables. */
export function CrewCaution() {
  return (
    <details className="border-l-2 border-l-copper py-1 pl-3">
      <summary className="min-h-6 touch:min-h-11">
        <b>Current electrodes carry hundreds of volts.</b> Keep clear while current flows.
      </summary>
      <ul className="mt-1.5 max-w-prose list-disc pl-5">
        <li>A and B are attended or fenced; animals and the public are kept off.</li>
        <li>No work in lightning or when it nears.</li>
        <li>Buried services and fences are checked first.</li>
        <li>Local code and the instrument’s manual rule.</li>
      </ul>
    </details>
  );
}
