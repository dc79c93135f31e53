/** The part of WebAssembly's interface that the engine uses; its types ship only with browser libraries. */
declare namespace WebAssembly {
  class Memory {
    constructor(descriptor: { initial: number })
    readonly buffer: ArrayBuffer
  }
  class Module {
    constructor(bytes: Uint8Array)
  }
  class Instance {
    constructor(module: Module, imports: Record<string, Record<string, unknown>>)
    readonly exports: Record<string, unknown>
  }
}
