declare module '@11ty/eleventy' {
  export interface RenderedPage {
    readonly url: string | false
    readonly outputPath: string | false
    readonly content: string
  }

  export default class Eleventy {
    constructor(input: string, output: string, options: object)
    disableLogger(): void
    toJSON(): Promise<readonly RenderedPage[]>
    write(): Promise<unknown>
  }
}
