export const USAGE = `Usage: npm run -s layerwell -- COMMAND

  forward        apparent resistivities of layered earths
  fit            layered earths from readings
  fit-line       layered earths of all soundings of a line, tied along it
  sample         the grounds that explain the readings, and how likely a wanted bed is
  schema [NAME]  the JSON Schema of a request or an answer; without NAME, the names

All but schema read one JSON object a line on standard input and write one a line on standard output, in the same
order. A line that cannot be used gives {"id", "error": {"code", "message", "path"}} and exit status 1 at the end.
Lengths in m, resistivities in Ω·m, errors relative (0.03 = 3 %).
`;
