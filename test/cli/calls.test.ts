import { describe, expect, it } from 'vitest'
import { throwaway } from '../whole/folder.js'
import { call } from './fake-io.js'

describe('a call', () => {
  it.each([['--help'], ['build', '--help'], ['check', '--help'], ['show', '--help'], ['serve', '--help']])(
    'explains itself: %s %s',
    async (...words) => {
      const { code, out, err } = await call(words, '.')
      expect({ code, err }).toEqual({ code: 0, err: '' })
      expect(out).toMatch(/^Usage: floorbook /)
      expect(out).toContain('--help')
    },
  )

  it('prints a version', async () => {
    expect(await call(['--version'], '.')).toMatchObject({
      code: 0,
      out: expect.stringMatching(/^\d+\.\d+\.\d+\n$/),
      err: '',
    })
  })

  it('without a command shows what there is, on the side of the errors', async () => {
    const { code, out, err } = await call([], '.')
    expect({ code, out }).toEqual({ code: 2, out: '' })
    expect(err).toContain('Usage: floorbook ')
  })

  it.each([
    [['shwo'], "floorbook: unknown command 'shwo' (Did you mean show?)\n"],
    [['check', '--jsn'], "floorbook: unknown option '--jsn' (Did you mean --json?)\n"],
    [['show'], "floorbook: missing required argument 'budget'\n"],
    [['show', 'a', 'b'], "floorbook: too many arguments for 'show'. Expected 1 argument but got 2.\n"],
    [['show', 'a', '--at'], "floorbook: option '--at <frequency...>' argument missing\n"],
    [
      ['serve', '--port', '99999'],
      'floorbook: --port: `99999` is not a port; write a number from 0 (any free one) to 65535\n',
    ],
    [['\u001b[31m\u202e'], "floorbook: unknown command '\\u{1b}[31m\\u{202e}'\n"],
  ])('that is wrong ends in one line: %j', async (words, line) => {
    expect(await call(words, throwaway({ 'budgets/tern/budget.yaml': '' }))).toEqual({ code: 2, out: '', err: line })
  })
})
