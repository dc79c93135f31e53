import { readFile } from 'node:fs/promises'
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http'
import { extname } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { locate } from './locate.js'

const types: ReadonlyMap<string, string> = new Map([
  ['.html', 'text/html; charset=utf-8'],
  ['.css', 'text/css; charset=utf-8'],
  ['.js', 'text/javascript; charset=utf-8'],
  ['.json', 'application/json; charset=utf-8'],
  ['.csv', 'text/csv; charset=utf-8'],
  ['.svg', 'image/svg+xml'],
  ['.png', 'image/png'],
  ['.woff2', 'font/woff2'],
  ['.xml', 'application/xml; charset=utf-8'],
  ['.txt', 'text/plain; charset=utf-8'],
])

/** While a new site takes the place of the old one its folder is away for a moment. */
const patience = 60

/** Hands out the files of one folder to this machine alone. */
export function siteServer(folder: string): Server {
  return createServer((request, response) => {
    answer(folder, request, response).catch(() => end(response, 500, 'the file could not be read'))
  })
}

async function answer(folder: string, request: IncomingMessage, response: ServerResponse): Promise<void> {
  if (request.method !== 'GET' && request.method !== 'HEAD') return end(response, 405, 'only GET and HEAD')
  // A page elsewhere may point its own name at this address; it must not read drafts that way.
  if (!/^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/.test(request.headers.host ?? ''))
    return end(response, 403, 'not here')
  const address = request.url ?? '/'
  const file = (await locate(folder, address)) ?? (await wait(patience).then(() => locate(folder, address)))
  if (file === null) return end(response, 404, 'no such page')
  if (isFolderWithoutSlash(address, file)) return redirect(response, address)
  const content = await readFile(file)
  response.writeHead(200, {
    'content-type': types.get(extname(file)) ?? 'application/octet-stream',
    'content-length': content.length,
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
  })
  response.end(request.method === 'HEAD' ? undefined : content)
}

/** Links of a page are relative, so that a folder's page must be read below its slash. */
function isFolderWithoutSlash(address: string, file: string): boolean {
  const path = address.replace(/[?#].*$/s, '')
  return file.endsWith('index.html') && !path.endsWith('/') && !path.endsWith('index.html')
}

/** To the last name alone, so that no address can lead to another host. */
function redirect(response: ServerResponse, address: string): void {
  const path = address.replace(/[?#].*$/s, '')
  response.writeHead(302, { location: `./${path.slice(path.lastIndexOf('/') + 1)}/` })
  response.end()
}

function end(response: ServerResponse, status: number, text: string): void {
  if (response.headersSent) return void response.destroy()
  response.writeHead(status, { 'content-type': 'text/plain; charset=utf-8', 'x-content-type-options': 'nosniff' })
  response.end(`${text}\n`)
}
