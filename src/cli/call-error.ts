/** The call itself is wrong: a name that nothing has, an option's value that cannot be read (exit code 2). */
export class CallError extends Error {
  constructor(message: string) {
    super(message)
    this.name = 'CallError'
  }
}
