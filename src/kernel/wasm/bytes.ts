/** Encodings of the WebAssembly binary format (WebAssembly Core Specification 2.0, W3C, chapter 5). */

/** An unsigned integer in LEB128. */
export function unsigned(value: number): number[] {
  const bytes: number[] = [];
  let rest = value;
  do {
    const low = rest % 128;
    rest = Math.floor(rest / 128);
    bytes.push(rest > 0 ? low + 128 : low);
  } while (rest > 0);
  return bytes;
}

/** A signed integer of 32 bits in LEB128. */
export function signed(value: number): number[] {
  const bytes: number[] = [];
  for (let rest = value; ; rest >>= 7) {
    const low = rest & 0x7f;
    // The sixth bit of the last byte is the sign.
    if (rest >> 6 === 0 || rest >> 6 === -1) return [...bytes, low];
    bytes.push(low | 0x80);
  }
}

const view = new DataView(new ArrayBuffer(8));
const bytesOfView = new Uint8Array(view.buffer);

/** A double, little end first. */
export function double(value: number): number[] {
  view.setFloat64(0, value, true);
  return [...bytesOfView];
}

/** Items with their number ahead. */
export function vector(items: readonly (readonly number[])[]): number[] {
  return [...unsigned(items.length), ...items.flat()];
}

/** Bytes with their number ahead. */
export function sized(bytes: readonly number[]): number[] {
  return [...unsigned(bytes.length), ...bytes];
}

export function text(name: string): number[] {
  return sized([...new TextEncoder().encode(name)]);
}

export function section(id: number, bytes: readonly number[]): number[] {
  return [id, ...sized(bytes)];
}
