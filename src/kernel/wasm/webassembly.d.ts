/** What is used here of the WebAssembly JavaScript Interface (W3C), which the library of ES2023 leaves out. */
declare namespace WebAssembly {
  class Module {
    constructor(bytes: Uint8Array);
  }
  class Instance {
    constructor(module: Module, imports?: Readonly<Record<string, Readonly<Record<string, unknown>>>>);
    readonly exports: { readonly [name: string]: unknown };
  }
  interface Memory {
    readonly buffer: ArrayBuffer;
  }
  function validate(bytes: Uint8Array): boolean;
}
