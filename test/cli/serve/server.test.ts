import { mkdtempSync, mkdirSync, realpathSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { request } from 'node:http'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { AddressInfo } from 'node:net'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { partsOf } from '../../../src/cli/serve/locate.js'
import { listenNear } from '../../../src/cli/serve/listen.js'
import { siteServer } from '../../../src/cli/serve/server.js'

const base = realpathSync(mkdtempSync(join(tmpdir(), 'floorbook-serve-')))
const site = join(base, 'site')
const server = siteServer(site)

interface Answer {
  readonly status: number
  readonly type: string | undefined
  readonly location: string | undefined
  readonly text: string
}

/** The address goes out as it is, without the tidying that `fetch` does. */
function get(path: string, options: { method?: string; host?: string } = {}): Promise<Answer> {
  const { port } = server.address() as AddressInfo
  const headers = { host: options.host ?? `127.0.0.1:${port}` }
  return new Promise((resolve, reject) => {
    const sent = request({ host: '127.0.0.1', port, path, method: options.method ?? 'GET', headers }, response => {
      let text = ''
      response.setEncoding('utf8')
      response.on('data', (piece: string) => (text += piece))
      response.on('end', () =>
        resolve({
          status: response.statusCode ?? 0,
          type: response.headers['content-type'],
          location: response.headers.location,
          text,
        }),
      )
    })
    sent.on('error', reject)
    sent.end()
  })
}

beforeAll(async () => {
  mkdirSync(join(site, 'tern', 'draft'), { recursive: true })
  writeFileSync(join(site, 'index.html'), 'front')
  writeFileSync(join(site, 'tern', 'draft', 'index.html'), 'report')
  writeFileSync(join(site, 'tern', 'draft', 'curves.csv'), 'f,total')
  writeFileSync(join(site, '.hidden'), 'hidden')
  writeFileSync(join(base, 'secret.txt'), 'secret')
  symlinkSync(join(base, 'secret.txt'), join(site, 'link.txt'))
  symlinkSync(base, join(site, 'up'))
  await listenNear(server, 0)
})

afterAll(() => {
  server.close()
  rmSync(base, { recursive: true, force: true })
})

describe('the local server', () => {
  it('hands out files and the index of a folder', async () => {
    expect(await get('/')).toMatchObject({ status: 200, text: 'front', type: 'text/html; charset=utf-8' })
    expect(await get('/tern/draft/?x=1#y')).toMatchObject({ status: 200, text: 'report' })
    expect(await get('/tern/draft/curves.csv')).toMatchObject({ text: 'f,total', type: 'text/csv; charset=utf-8' })
  })

  it('leads to the slash of a folder, so that relative links hold', async () => {
    expect(await get('/tern/draft')).toMatchObject({ status: 302, location: './draft/' })
    expect((await get('//elsewhere.example/..')).location).toBe(undefined)
  })

  it.each([
    '/../secret.txt',
    '/tern/../../secret.txt',
    '/%2e%2e/secret.txt',
    '/..%2fsecret.txt',
    '/..%5csecret.txt',
    '/..\\secret.txt',
    '/%252e%252e/secret.txt',
    '/tern/%00/../../secret.txt',
    '/link.txt',
    '/up/secret.txt',
    '/.hidden',
    '/%',
    '//etc/passwd',
    '/C:/secret.txt',
  ])('gives nothing for %s', async path => {
    const { status, text } = await get(path)
    expect({ status, text }).toEqual({ status: 404, text: 'no such page\n' })
  })

  it('answers a look and refuses every other method', async () => {
    expect(await get('/', { method: 'HEAD' })).toMatchObject({ status: 200, text: '' })
    expect(await get('/', { method: 'POST' })).toMatchObject({ status: 405 })
  })

  it('answers to its own name alone', async () => {
    expect(await get('/', { host: 'localhost:1' })).toMatchObject({ status: 200 })
    expect(await get('/', { host: 'site.example' })).toMatchObject({ status: 403, text: 'not here\n' })
  })

  it('takes another port where the wanted one is taken', async () => {
    const { port } = server.address() as AddressInfo
    const second = siteServer(site)
    const other = await listenNear(second, port)
    expect(other).not.toBe(port)
    expect(second.address()).toMatchObject({ address: '127.0.0.1' })
    second.close()
  })
})

describe('the parts of an address', () => {
  it('are plain names', () => {
    expect(partsOf('/a/b%20c/')).toEqual(['a', 'b c'])
    expect(partsOf('/a/./b')).toBe(null)
    expect(partsOf('/a/%0a')).toBe(null)
  })
})
