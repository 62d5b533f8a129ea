/** WebAssembly instructions as bytes; those of an expression leave its value on the stack. Source: WebAssembly 2.0, chapter 5. */
export type Code = readonly number[];

/** A local of a routine; as an expression its value. */
export type Local = readonly [get: 0x20, place: number];

export const DOUBLE = 8;
export const PAIR = 2 * DOUBLE;

const I32 = 0x7f;
const V128 = 0x7b;
const NO_RESULT = 0x40;

/** LEB128 of a whole number ≥ 0. */
function unsigned(value: number): number[] {
  const low = value & 0x7f;
  return value < 0x80 ? [low] : [low | 0x80, ...unsigned(value >>> 7)];
}

/** LEB128 of a signed whole number. */
function signed(value: number): number[] {
  const low = value & 0x7f;
  return value >= -0x40 && value < 0x40 ? [low] : [low | 0x80, ...signed(value >> 7)];
}

const list = (items: readonly Code[]): Code => [...unsigned(items.length), ...items.flat()];
const sized = (body: Code): Code => [...unsigned(body.length), ...body];
const text = (value: string): Code => list(Array.from(value, (letter) => [letter.charCodeAt(0)]));
/** aligned to a double, at a constant offset in bytes */
const at = (offset: number): Code => [3, ...unsigned(offset)];
const simd = (operation: number): Code => [0xfd, ...unsigned(operation)];
const binary =
  (operation: Code) =>
  (a: Code, b: Code): Code => [...a, ...b, ...operation];

const value = (number: number): Code => [0x41, ...signed(number)];

/** Whole numbers of 32 bits: counts, and addresses in bytes. */
export const i32 = {
  value,
  add: binary([0x6a]),
  sub: binary([0x6b]),
  mul: binary([0x6c]),
  /** bytes of so many doubles */
  bytes: (count: Code): Code => [...count, ...value(DOUBLE), 0x6c],
  load: (address: Code, offset = 0): Code => [...address, 0x28, 2, ...unsigned(offset)],
};

/** Pairs of doubles. Each half is rounded by itself as IEEE 754 has it, so its bits are those of plain arithmetic. */
export const pair = {
  load: (address: Code, offset = 0): Code => [...address, ...simd(0x00), ...at(offset)],
  /** one double in both halves */
  loadTwice: (address: Code): Code => [...address, ...simd(0x0a), ...at(0)],
  twice: (number: number): Code => [0x44, ...new Uint8Array(Float64Array.of(number).buffer), ...simd(0x14)],
  store: (address: Code, a: Code): Code => [...address, ...a, ...simd(0x0b), ...at(0)],
  storeHalf: (address: Code, a: Code, half: number, offset: number): Code => [
    ...address,
    ...a,
    ...simd(0x5b),
    ...at(offset),
    half,
  ],
  negated: (a: Code): Code => [...a, ...simd(0xed)],
  add: binary(simd(0xf0)),
  sub: binary(simd(0xf1)),
  mul: binary(simd(0xf2)),
  div: binary(simd(0xf3)),
};

export const set = ([, place]: Local, a: Code): Code => [...a, 0x21, place];
export const increase = (local: Local, by: Code): Code => set(local, i32.add(local, by));

/** `body` over and over while `local` < `end`, which grows by `step` each time. */
export const loop = (local: Local, end: Code, step: number, body: Code): Code =>
  [
    [0x02, NO_RESULT, 0x03, NO_RESULT],
    [...local, ...end, 0x4e, 0x0d, 1],
    body,
    increase(local, value(step)),
    [0x0c, 0, 0x0b, 0x0b],
  ].flat();

/** A function of whole numbers without a result. */
export interface Routine {
  readonly name: string;
  readonly parameters: number;
  /** types of the locals beyond the parameters */
  readonly locals: readonly number[];
  readonly body: Code;
}

/** A routine by the names of its parameters, of its further whole numbers and of its pairs. */
export function routine<Parameter extends string, Whole extends string, Pair extends string>(
  name: string,
  parameters: readonly Parameter[],
  wholes: readonly Whole[],
  pairs: readonly Pair[],
  write: (locals: Readonly<Record<Parameter | Whole | Pair, Local>>) => Code,
): Routine {
  const names: (Parameter | Whole | Pair)[] = [...parameters, ...wholes, ...pairs];
  const locals = Object.fromEntries(names.map((one, place): [string, Local] => [one, [0x20, place]]));
  return {
    name,
    parameters: parameters.length,
    locals: [...wholes.map(() => I32), ...pairs.map(() => V128)],
    body: write(locals as Record<Parameter | Whole | Pair, Local>),
  };
}

/** The bytes of a module with these routines over one memory of `pages` × 64 KiB, which it exports as "memory". */
export function assemble(routines: readonly Routine[], pages: number): Uint8Array {
  const types = routines.map(({ parameters }): Code => {
    const taken = Array.from({ length: parameters }, (): Code => [I32]);
    return [0x60, ...list(taken), 0];
  });
  const exported = routines.map(({ name }, i): Code => [...text(name), 0, i]);
  const bodies = routines.map(({ locals, body }): Code =>
    sized([...list(locals.map((type) => [1, type])), ...body, 0x0b]),
  );
  const section = (id: number, items: readonly Code[]): Code => [id, ...sized(list(items))];
  return Uint8Array.from(
    [
      [0x00, 0x61, 0x73, 0x6d, 1, 0, 0, 0],
      section(1, types),
      section(
        3,
        routines.map((_, i) => [i]),
      ),
      section(5, [[0, ...unsigned(pages)]]),
      section(7, [[...text('memory'), 2, 0], ...exported]),
      section(10, bodies),
    ].flat(),
  );
}
